import { productRows } from './product-rows';

const lastTime = {
  completedOn: '2026-01-20',
  products: [{ product: 'CW1', ml: 3900 }],
  estimate: null,
  temperatureC: null,
  humidityPct: null,
};
const norms = [
  { product: 'UW1', ml: 4200 },
  { product: 'CW1', ml: 3800 },
];
const plain = (text: string | undefined): string | undefined => text?.replace(/\u202f/g, ' ');

describe('productRows', () => {
  it('of a car, given what was used last time, offers that first; the norm is only told', () => {
    const rows = productRows({}, norms, lastTime);
    expect(rows.map(({ product }) => product)).toEqual(['CW1', 'UW1']);
    expect(rows.map(({ note }) => plain(note))).toEqual(['norm 3.8 L', 'norm 4.2 L']);
    const written = productRows({ products: [{ product: 'CW1', ml: 4000 }] }, norms, lastTime);
    expect(plain(written[0]?.note)).toBe('norm 3.8 L, last time 3.9 L');
    expect(rows.map(({ offer }) => plain(offer?.words))).toEqual([
      '3.9 L, as last time',
      undefined,
    ]);
  });

  it('of a car, given amounts written down, offers nothing for them and keeps others in sight', () => {
    const document = {
      products: [
        { product: 'CW1', ml: 0 },
        { product: 'RC1', ml: 200 },
      ],
    };
    const rows = productRows(document, norms, null);
    expect(rows.map(({ product, offer }) => [product, offer !== undefined])).toEqual([
      ['UW1', false],
      ['CW1', false],
      ['RC1', false],
    ]);
    expect(rows.at(-1)).toMatchObject({ note: '', by: 100 });
  });
});
