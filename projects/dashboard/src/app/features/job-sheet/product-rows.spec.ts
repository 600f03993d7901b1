import { productRows } from './product-rows';

describe('productRows', () => {
  it('of a product the norm names but nobody used shows 0 against the norm', () => {
    expect(productRows([], [{ product: 'CW1', ml: 4000 }])).toEqual([
      { product: 'CW1', ml: 0, normMl: 4000 },
    ]);
  });

  it('of several lines of one product adds them up', () => {
    const used = [
      { product: 'CW1', ml: 3000 },
      { product: 'CW1', ml: 1200 },
      { product: 'ZP1', ml: 50 },
    ];
    expect(productRows(used, [{ product: 'CW1', ml: 4000 }])).toEqual([
      { product: 'CW1', ml: 4200, normMl: 4000 },
      { product: 'ZP1', ml: 50, normMl: null },
    ]);
  });
});
