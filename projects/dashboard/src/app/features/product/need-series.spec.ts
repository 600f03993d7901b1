import { productNeed, productNeedAnswer } from '../../testing/product-answers';
import { formatDateRange } from '../../ui/format';
import { needView } from './need-series';
import type { ProductWords } from './product-words';

const words: ProductWords = {
  currency: 'EUR',
  branchName: (code) => code,
  packageWord: (code) => code,
  productName: (code) => (code === 'CW1' ? 'Cavity wax' : 'Rust converter'),
  isWax: () => true,
};
const view = (more: Parameters<typeof productNeedAnswer>[0] = {}) =>
  needView(productNeedAnswer(more), words);
const plain = (text: string) => text.replaceAll('\u202f', ' ').replaceAll('\u2009', ' ');

describe('needView', () => {
  it('how it came about: cars in the diary, usual ones, and what the usual goes by', () => {
    expect(view().from).toContain(
      '23 cars in the diary, about 61 more as usual, each with what such cars took; usual going by 270 cars of ',
    );
    expect(view().coming).toBe(formatDateRange('2026-02-09', '2026-04-05'));
  });

  it('an empty diary: usual cars alone; nothing at all: says so', () => {
    const weeks = productNeedAnswer().weeks.map((week) => ({ ...week, booked: 0 }));
    expect(view({ weeks }).from).toContain('Nothing in the diary, about 61 as usual');
    const none = weeks.map((week) => ({ ...week, usual: 0 }));
    expect(view({ weeks: none, needs: [] }).from).toContain('No car is in the diary');
  });

  it('litres: whole where the range is wide, tenths where it is narrow; largest first', () => {
    const printed = view().printed.map(({ name, expected, range, cost }) =>
      [name, expected, range, cost].map(plain),
    );
    expect(printed).toEqual([
      ['Cavity wax', '340 L', '300–381 L', '€3,740'],
      ['Rust converter', '6.2 L', '4.1–8.3 L', ''],
    ]);
  });

  it('a cost not known today: told in its row and below, the sum is of the others', () => {
    const v = view({ missingCosts: [{ product: 'RC1', on: '2026-02-02' }] });
    const cost = v.columns.find(({ key }) => key === 'cost')!;
    expect(cost.text(v.rows[1]!)).toBe('cost not known');
    expect(cost.total).toBe('3,740');
    expect(v.outside).toEqual(['No cost is known today of Rust converter: the sum is without it.']);
  });

  it('cars of a kind with no use known: told plainly', () => {
    expect(view({ carsWithoutUse: 0 }).outside).toEqual([]);
    expect(view({ carsWithoutUse: 2.6 }).outside[0]).toContain(
      'About 3 of these cars are of a kind with no use known',
    );
    expect(view({ carsWithoutUse: 0.3 }).outside[0]).toContain('Less than one of these cars is');
  });

  it('nothing finished in the time: taken at the norm, without a range', () => {
    const v = view({ jobs: 0, needs: [productNeed({ lowerMl: 340_400, upperMl: 340_400 })] });
    expect(v.from).toContain('each is taken at its norm');
    expect(v.printed[0]!.range).toBe('');
  });

  it('one product: the file is of this product', () => {
    expect(view({ needs: [productNeed()] }).csv).toBe('CSV of this product');
  });
});
