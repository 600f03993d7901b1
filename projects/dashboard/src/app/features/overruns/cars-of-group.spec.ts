import { carsOfGroup } from './cars-of-group';

const period = { from: '2025-08-04', to: '2026-01-20' };

describe('carsOfGroup', () => {
  it.each([
    ['ageBand', '10-14', { ageBand: '10-14' }],
    ['branch', 'HAV', { branch: 'HAV' }],
    ['package', 'full', { package: 'full' }],
    ['bodyType', 'van', { bodyType: 'van' }],
    ['rotFound', 'found', { hasRot: 'true' }],
    ['rotFound', 'not_found', { hasRot: 'false' }],
  ] as const)(
    '%s %s: the page’s dates, cars with an estimate, and the group',
    (by, key, narrowed) => {
      expect(carsOfGroup(by, key, period)).toEqual({
        ...period,
        hasEstimate: 'true',
        sort: 'overrun',
        ...narrowed,
      });
    },
  );

  it('a month inside the dates: its first to its last day', () => {
    expect(carsOfGroup('month', '2025-09', period)).toMatchObject({
      from: '2025-09-01',
      to: '2025-09-30',
    });
  });

  it('a month cut by the dates: only what was counted', () => {
    expect(carsOfGroup('month', '2025-08', period)).toMatchObject({
      from: '2025-08-04',
      to: '2025-08-31',
    });
    expect(carsOfGroup('month', '2026-01', period)).toMatchObject({
      from: '2026-01-01',
      to: '2026-01-20',
    });
  });
});
