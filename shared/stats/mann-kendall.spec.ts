import fc from 'fast-check';
import { mannKendall } from './mann-kendall';

describe('mannKendall', () => {
  it('given fewer than 2 values, is undefined', () => {
    expect(mannKendall([])).toBeUndefined();
    expect(mannKendall([4])).toBeUndefined();
  });

  it('given a list turned round, keeps p and turns S and Z round', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 0, max: 9 }), { minLength: 2 }), (list) => {
        const forward = mannKendall(list);
        const backward = mannKendall([...list].reverse());
        expect(backward?.p).toBe(forward?.p);
        expect((backward?.s as number) + (forward?.s as number)).toBe(0);
        expect((backward?.z as number) + (forward?.z as number)).toBe(0);
        expect(forward?.p).toBeGreaterThan(0);
        expect(forward?.p).toBeLessThanOrEqual(1);
      }),
    );
  });

  it('given a long steady rise, has a tiny p that 1 − cdf would lose', () => {
    const p = mannKendall(Array.from({ length: 60 }, (_, week) => week))?.p as number;
    expect(p).toBeGreaterThan(0);
    expect(p).toBeLessThan(1e-20);
  });

  it('given NaN, throws', () => {
    expect(() => mannKendall([1, Number.NaN])).toThrow(RangeError);
  });
});
