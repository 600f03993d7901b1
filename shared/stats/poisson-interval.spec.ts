import fc from 'fast-check';
import { poissonInterval } from './poisson-interval';

describe('poissonInterval', () => {
  it('given no event, reaches from exactly 0 to the mean that gives none in one case of 40', () => {
    const { lower, upper } = poissonInterval(0);
    expect(lower).toBe(0);
    expect(Math.exp(-upper)).toBeCloseTo(0.025, 12);
  });

  it('given any count, encloses it, and one event more moves both limits up', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 100_000 }), (count) => {
        const here = poissonInterval(count);
        const next = poissonInterval(count + 1);
        expect(here.lower).toBeLessThanOrEqual(count);
        expect(here.upper).toBeGreaterThan(count);
        expect(next.lower).toBeGreaterThan(here.lower);
        expect(next.upper).toBeGreaterThan(here.upper);
      }),
    );
  });

  it('given any small count, leaves half of 5 % to the sum of Poisson terms on either side', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 60 }), (count) => {
        const { lower, upper } = poissonInterval(count);
        expect(1 - upTo(count - 1, lower)).toBeCloseTo(0.025, 10);
        expect(upTo(count, upper)).toBeCloseTo(0.025, 10);
      }),
    );
  });

  it.each([
    [-1, 0.95],
    [1.5, 0.95],
    [Number.NaN, 0.95],
    [1, 0],
    [1, 1],
  ])('given %d at level %d, throws', (count, level) => {
    expect(() => poissonInterval(count, level)).toThrow(RangeError);
  });
});

/** The probability of at most `count` events where `mean` are expected, term by term. */
function upTo(count: number, mean: number): number {
  let term = Math.exp(-mean);
  let sum = term;
  for (let k = 1; k <= count; k += 1) {
    term *= mean / k;
    sum += term;
  }
  return sum;
}
