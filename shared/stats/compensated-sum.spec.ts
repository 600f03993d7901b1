import fc from 'fast-check';
import { compensatedSum } from './compensated-sum';

describe('compensatedSum', () => {
  it('given terms that cancel, keeps what plain addition loses', () => {
    const terms = [1, 1e100, 1, -1e100];
    expect(terms.reduce((sum, term) => sum + term, 0)).toBe(0);
    expect(compensatedSum(terms)).toBe(2);
  });

  it('given a tenth ten times, gives exactly one', () => {
    expect(compensatedSum(new Array<number>(10).fill(0.1))).toBe(1);
  });

  it('given no values, gives 0', () => {
    expect(compensatedSum([])).toBe(0);
  });

  it('given whole numbers, gives their exact sum', () => {
    fc.assert(
      fc.property(fc.array(fc.integer()), (list) => {
        expect(compensatedSum(Float64Array.from(list))).toBe(
          Number(list.reduce((sum, value) => sum + BigInt(value), 0n)),
        );
      }),
    );
  });

  it('given NaN or an infinity, throws', () => {
    expect(() => compensatedSum([1, Number.NaN])).toThrow(RangeError);
    expect(() => compensatedSum([Number.NEGATIVE_INFINITY])).toThrow(RangeError);
  });
});
