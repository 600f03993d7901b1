import { isDangerous, isLeftDangerous } from './danger';

describe('isDangerous', () => {
  it('given rot in a load-bearing place, seen or only worked as such, says so', () => {
    expect(isDangerous({ structural: true, seenAs: 'bubbling' })).toBe(true);
    expect(isDangerous({ structural: true, seenAs: 'surface', workedAs: 'holed' })).toBe(true);
    expect(isDangerous({ structural: true, seenAs: 'holed', workedAs: null })).toBe(true);
  });

  it('given surface rust, or rot in a place that bears nothing, does not', () => {
    expect(isDangerous({ structural: true, seenAs: 'surface', workedAs: 'surface' })).toBe(false);
    expect(isDangerous({ structural: false, seenAs: 'holed' })).toBe(false);
  });
});

describe('isLeftDangerous', () => {
  it('given such rot patched or treated, is content; deferred or declined, it is not', () => {
    const rot = { structural: true, seenAs: 'holed' } as const;
    expect(
      (['treated', 'patched'] as const).map((action) => isLeftDangerous({ ...rot, action })),
    ).toEqual([false, false]);
    expect(
      (['deferred', 'declined'] as const).map((action) => isLeftDangerous({ ...rot, action })),
    ).toEqual([true, true]);
  });
});
