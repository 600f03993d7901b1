import fc from 'fast-check';
import { logRise, riseSlope } from './rising-factorial';

const shapes = fc.double({ min: -4, max: 12, noNaN: true }).map((power) => 10 ** power);
const counts = fc.integer({ min: 0, max: 3000 });

/** The definition, added up from the smallest terms. */
function addedUp(k: number, term: (j: number) => number): number {
  return Array.from({ length: k }, (_, j) => term(j)).reduce((sum, part) => sum + part, 0);
}

describe('logRise and riseSlope', () => {
  it('given any shape and count, are the sums they stand for', () => {
    fc.assert(
      fc.property(shapes, counts, (a, k) => {
        const rise = addedUp(k, (j) => Math.log1p(j / a));
        const slope = addedUp(k, (j) => j / (a + j));
        expect(Math.abs(logRise(a, k) - rise)).toBeLessThanOrEqual(1e-11 * rise);
        expect(Math.abs(riseSlope(a, k) - slope)).toBeLessThanOrEqual(1e-11 * slope);
      }),
    );
  });
});
