import fc from 'fast-check';
import { addDays } from './calendar';
import { CostBook, FROM_THE_START, type CostChange } from './cost-book';

const rate = (from: string, value: number) =>
  ({ kind: 'hourlyCost', code: 'AAA', from, value }) as const;

describe('CostBook of dated costs', () => {
  const book = CostBook.of([rate('2025-01-01', 3000), rate('2026-01-01', 3600)]);

  it('given the day a cost begins, takes it (rule 11: from is inclusive)', () => {
    expect(book.hourlyCost('AAA', '2025-12-31')).toBe(3000);
    expect(book.hourlyCost('AAA', '2026-01-01')).toBe(3600);
  });

  it('given a day before the first cost, knows none (rule 11: never 0, never a later one)', () => {
    expect(book.hourlyCost('AAA', '2024-12-31')).toBeUndefined();
  });

  it('given another code of the same kind, or the same code of another kind, knows none', () => {
    expect(book.hourlyCost('BBB', '2026-06-01')).toBeUndefined();
    expect(book.productCost('AAA', '2026-06-01')).toBeUndefined();
  });

  it('given the base fee, has it valid on every day', () => {
    const fees = CostBook.of([{ kind: 'fee', from: FROM_THE_START, value: 50_000 }]);
    expect(fees.feeMicros('1000-01-01')).toBe(50_000);
  });

  it('given any entries in any order, finds what a plain search finds', () => {
    const entry = fc.record({ day: fc.integer({ min: 0, max: 60 }), value: fc.nat(9999) });
    fc.assert(
      fc.property(fc.array(entry), fc.integer({ min: 0, max: 60 }), (entries, asked) => {
        const date = (day: number) => addDays('2025-01-01', day);
        const made = CostBook.of(entries.map(({ day, value }) => rate(date(day), value)));
        const before = entries.filter(({ day }) => day <= asked);
        const latest = Math.max(...before.map(({ day }) => day));
        const plain = before.filter(({ day }) => day === latest).at(-1)?.value;
        expect(made.hourlyCost('AAA', date(asked))).toBe(plain);
      }),
    );
  });
});

describe('CostBook.with', () => {
  const book = CostBook.of([rate('2025-01-01', 3000)]);

  it('given a change, leaves the book it was made from as it was', () => {
    const next = book.with(rate('2025-01-01', 1));
    expect(next.hourlyCost('AAA', '2025-06-01')).toBe(1);
    expect(book.hourlyCost('AAA', '2025-06-01')).toBe(3000);
  });

  it('given a norm without lines, has no norm any more', () => {
    const norm = (lines: { product: string; ml: number }[]): CostChange => ({
      kind: 'norm',
      package: 'full',
      bodyType: 'suv',
      lines,
    });
    const with1 = book.with(norm([{ product: 'CW1', ml: 1 }]));
    expect(with1.norm('full', 'suv')).toEqual([{ product: 'CW1', ml: 1 }]);
    expect(with1.norm('full', 'van')).toBeUndefined();
    expect(with1.with(norm([])).norm('full', 'suv')).toBeUndefined();
    expect(CostBook.of([norm([])]).norm('full', 'suv')).toBeUndefined();
  });

  it('given norm lines in another order, holds the same norm', () => {
    const lines = [
      { product: 'UW1', ml: 2 },
      { product: 'CW1', ml: 1 },
    ];
    const norm = { kind: 'norm', package: 'full', bodyType: 'suv' } as const;
    const one = book.with({ ...norm, lines });
    const other = book.with({ ...norm, lines: [...lines].reverse() });
    expect(one.norm('full', 'suv')).toEqual(other.norm('full', 'suv'));
    expect(CostBook.of([{ ...norm, lines }]).norm('full', 'suv')).toEqual(one.norm('full', 'suv'));
  });
});

describe('CostBook.reach', () => {
  const book = CostBook.of([rate('2025-01-01', 1), rate('2026-01-01', 2)]);

  it('given a change before a later entry, reaches up to it', () => {
    expect(book.reach(rate('2025-06-01', 9))).toEqual({ from: '2025-06-01', before: '2026-01-01' });
    expect(book.reach(rate('2025-01-01', 9))).toEqual({ from: '2025-01-01', before: '2026-01-01' });
  });

  it('given the last entry, reaches without end', () => {
    expect(book.reach(rate('2026-01-01', 9))).toEqual({ from: '2026-01-01', before: null });
  });
});
