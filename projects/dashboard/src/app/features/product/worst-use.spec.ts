import { fewUse, normlessUse, productUse } from '../../testing/product-answers';
import { worstUse } from './worst-use';

describe('worstUse', () => {
  it('a kind of car with enough under: that kind', () => {
    const found = worstUse([
      productUse({ bodyType: 'van', under: 3, underShare: 0.03 }),
      productUse({ under: 30, underShare: 0.3 }),
    ]);
    expect(found).toMatchObject({ under: 30, cars: 100, kind: { bodyType: 'hatchback' } });
  });

  it('fewer of each kind: cars of all its kinds added up, product by product', () => {
    const found = worstUse([
      productUse({ under: 2, underShare: 0.02 }),
      productUse({ bodyType: 'van', cars: 50, carsListing: 49, under: 2, underShare: 0.04 }),
      productUse({ product: 'SC1', under: 1, underShare: 0.01 }),
    ]);
    expect(found).toEqual({ product: 'CW1', kind: null, cars: 150, carsListing: 149, under: 4 });
  });

  it('no norm, too few cars, nobody under: nothing', () => {
    expect(worstUse([normlessUse(), fewUse(), productUse({ under: 0, underShare: 0 })])).toBe(
      undefined,
    );
  });
});
