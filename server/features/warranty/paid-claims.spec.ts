import type { CarsAsked } from './cars-asked';
import { paidTriangleOf } from './paid-claims';

/** Cars of these half-years, none of them with a claim. */
function withoutClaims(...cohorts: string[]): CarsAsked {
  const none = { covers: [], claims: [], firstClaims: new Map<number, number>() };
  const cars = { completedOn: [] } as unknown as CarsAsked['cars'];
  return { asOf: '2021-02-10', cars, cohorts, ...none };
}

describe('paidTriangleOf', () => {
  it('given every car finished after the evaluation day, has no half-year (rule 18)', () => {
    const triangle = paidTriangleOf(withoutClaims('2021-H1', '2021-H1'), '2020-12-31');
    expect(triangle).toEqual({ cohorts: [], rows: [] });
  });

  it('given cars of half-years apart, has every half-year from the oldest (rule 18)', () => {
    const triangle = paidTriangleOf(withoutClaims('2021-H1', '2020-H1'), '2021-06-30');
    expect(triangle.cohorts).toEqual(['2020-H1', '2020-H2', '2021-H1']);
    expect(triangle.rows.map((row) => row.length)).toEqual([3, 2, 1]);
  });

  it('given no car, has no half-year', () => {
    expect(paidTriangleOf(withoutClaims(), '2020-12-31').cohorts).toEqual([]);
  });
});
