import {
  fewUse,
  noProducts,
  normlessUse,
  productBranch,
  productsAnswer,
  productUse,
} from '../../testing/product-answers';
import { carsOfUse } from './cars-of-use';
import { productsView } from './product-series';
import type { ProductWords } from './product-words';

const words: ProductWords = {
  currency: 'EUR',
  branchName: (code) => ({ BRE: 'Sundby', HAV: 'Havnsund' })[code] ?? code,
  packageWord: (code) => code,
  productName: (code) => (code === 'CW1' ? 'Cavity wax' : 'Rust converter'),
  isWax: () => true,
};
const links = {
  filters: { branch: ['HAV'] },
  branch: (branch: string) => ({ commands: ['/product'], query: { branch } }),
};
const view = (more: Parameters<typeof productsAnswer>[0] = {}, asked?: string) =>
  productsView(productsAnswer(more), asked, words, links);
const cell = (row: ReturnType<typeof productUse>, key: string) => {
  const column = view().chosen!.columns.find((one) => one.key === key)!;
  return { text: column.text(row).replaceAll('\u202f', ' '), link: column.link?.(row), column };
};

describe('productsView', () => {
  it('opened without a product: the one in most cars; with one it knows: that', () => {
    expect(view().offered.map(({ code }) => code)).toEqual(['CW1', 'RC1']);
    expect(view().chosen?.product).toBe('CW1');
    expect(view({}, 'RC1').chosen?.product).toBe('RC1');
    expect(view({}, 'nonsense').chosen?.product).toBe('CW1');
  });

  it('the picture: packages of most cars first, kinds too; those of few cars share one hatched row', () => {
    const { groups } = view().chosen!.picture!;
    expect(groups.map(({ label }) => label)).toEqual(['full', 'cavity']);
    expect(groups[0]!.rows.map(({ label, count }) => [label, count])).toEqual([
      ['hatchback', '120'],
      ['estate', '100'],
      ['2 more kinds', '5'],
    ]);
    expect(groups[0]!.rows[2]).toMatchObject({ spread: null, text: 'too few cars of each yet' });
  });

  it('a row of the picture: quantiles as shares of its norm, under and over in words', () => {
    const row = view().chosen!.picture!.groups[0]!.rows[0]!;
    expect(row.spread?.median).toBeCloseTo(3800 / 4000, 12);
    expect(row.spread?.p90).toBeCloseTo(4600 / 4000, 12);
    expect(row.under).toBe('18\u202f% under');
    expect(row.over).toBe('2\u202f% over');
    expect(row.strong).toBe(true);
  });

  it('nobody under: no words of it', () => {
    const { rows } = view().chosen!.picture!.groups[1]!;
    expect(rows[0]).toMatchObject({ under: '', strong: false });
  });

  it('a product without a norm: no picture, its rows in a list apart', () => {
    const { picture, rows, normless } = view({}, 'RC1').chosen!;
    expect(picture).toBeNull();
    expect(rows).toEqual([]);
    expect(normless).toHaveLength(1);
  });

  it('norm for one kind only: the other stands in the list', () => {
    const use = [productUse(), normlessUse({ product: 'CW1', bodyType: 'van' })];
    const chosen = view({ use }).chosen!;
    expect(chosen.rows.map(({ bodyType }) => bodyType)).toEqual(['hatchback']);
    expect(chosen.normless.map(({ bodyType }) => bodyType)).toEqual(['van']);
  });

  it('rows: most cars under first; the cell of those under leads to them', () => {
    const { rows } = view().chosen!;
    expect(rows.map(({ under }) => under)).toEqual([22, 3, 1, 0, 0]);
    expect(cell(rows[0]!, 'under')).toMatchObject({
      text: '18 %',
      link: { commands: ['/jobs'], query: { use: 'under', product: 'CW1', branch: ['HAV'] } },
    });
    expect(cell(productUse({ under: 0, underShare: 0 }), 'under').link).toBeUndefined();
  });

  it('few cars: counts stay, shares do not', () => {
    expect(cell(fewUse(), 'under').text).toBe('1 car');
    expect(cell(fewUse(), 'median').text).toBe('too few cars yet');
  });

  it('cars that got none: counted beside those under', () => {
    expect(cell(productUse({ under: 3, cars: 100, carsListing: 98 }), 'none').text).toBe('2');
  });

  it('one car under of 400: a share that is there is never written as 0', () => {
    expect(cell(productUse({ under: 1, underShare: 1 / 400 }), 'under').text).toBe('<1 %');
    expect(cell(productUse({ under: 0, underShare: 0 }), 'under').text).toBe('0 %');
  });

  it('branches: by name, with triangle and word where the interval misses 1; one branch has no picture', () => {
    expect(view().branches).toBeNull();
    const branches = [
      productBranch('BRE', { ratioToNorm: 1.1, lower: 1.05, upper: 1.15 }),
      productBranch('HAV'),
      productBranch('ZZZ', { ratioToNorm: 1, lower: 0.9, upper: 1.1 }),
      productBranch('AAA', { cars: 2, ratioToNorm: null, lower: null, upper: null }),
    ];
    const { ratios, rows } = view({ branches }).branches!;
    expect(rows.map(({ branch }) => branch)).toEqual(['AAA', 'HAV', 'BRE', 'ZZZ']);
    expect(ratios.rows.map(({ stand, word }) => [stand, word])).toEqual([
      ['as_expected', ''],
      ['below', 'below'],
      ['above', 'above'],
      ['as_expected', ''],
    ]);
    expect(ratios.rows[0]!.text).toBe('too few cars yet');
    expect(ratios.scale).toBe('log');
  });

  it('cars without a known cost: told, with the product', () => {
    expect(view().apart).toBeNull();
    const missingCosts = [{ kind: 'product' as const, code: 'CW1', on: '2026-01-03' }];
    expect(view({ withoutCost: 2, missingCosts }).apart).toBe(
      '2 cars stand outside the costs: no cost of Cavity wax was known on their days.',
    );
  });

  it('no job: an answer and nothing else', () => {
    const none = productsView(noProducts(), undefined, words, links);
    expect(none.chosen).toBeNull();
    expect(none.offered).toEqual([]);
  });
});

describe('carsOfUse', () => {
  const period = { from: '2025-08-04', to: '2026-02-01' };

  it('with a norm: all cars of the kind, for those without any count too', () => {
    expect(carsOfUse(productUse(), 'all', period)).toEqual({
      ...period,
      package: 'full',
      bodyType: 'hatchback',
    });
  });

  it('without a norm: those that list the product', () => {
    expect(carsOfUse(normlessUse(), 'all', period)).toMatchObject({ product: 'RC1' });
  });

  it('under or over: the product and which', () => {
    expect(carsOfUse(productUse(), 'over', period)).toMatchObject({ product: 'CW1', use: 'over' });
  });
});
