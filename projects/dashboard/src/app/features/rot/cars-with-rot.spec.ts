import { carsWithRot } from './cars-with-rot';

const period = { from: '2025-08-04', to: '2026-02-01' };

describe('carsWithRot', () => {
  it('a place of one age, in a scope: scope, dates and place, rot only', () => {
    const narrowing = { ageBand: '10-14', zone: 'sill_outer', side: 'left' } as const;
    expect(carsWithRot({ branch: ['HAV'] }, period, narrowing)).toEqual({
      branch: ['HAV'],
      ...period,
      hasRot: 'true',
      ...narrowing,
    });
  });

  it('all ages of a region, in a scope of two: the region takes the place of both', () => {
    const query = carsWithRot({ region: ['IH', 'OC'] }, period, { ageBand: null, region: 'OC' });
    expect(query).toEqual({ region: 'OC', ...period, hasRot: 'true' });
  });
});
