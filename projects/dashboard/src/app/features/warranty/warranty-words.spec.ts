import { expectedText, freeShare, groupName, halfYearDays, pText, standOf } from './warranty-words';

const words = {
  currency: 'EUR',
  branchName: (code: string) => `branch ${code}`,
  regionName: (code: string) => `region ${code}`,
  packageWord: (code: string) => code.replace('_', ' '),
};

describe('standOf', () => {
  it.each([
    [1.01, 2, 'above'],
    [0.4, 0.99, 'below'],
    [0.8, 1.2, 'as_expected'],
    [1, 2, 'as_expected'],
    [null, null, 'as_expected'],
  ] as const)('an interval from %s to %s stands %s', (lower, upper, stand) => {
    expect(standOf({ lower, upper })).toBe(stand);
  });
});

describe('groupName', () => {
  it.each([
    ['package', 'top_up', 'top up'],
    ['region', 'OC', 'region OC'],
    ['branch', 'HAV', 'branch HAV'],
    ['ageBand', '10-14', '10–14 years'],
    ['cohort', '2024-H1', '2024 H1'],
  ] as const)('of a %s, %s, is %s', (by, key, name) => {
    expect(groupName(by, key, words)).toBe(name);
  });
});

describe('halfYearDays', () => {
  it('of either half: its first and last day', () => {
    expect(halfYearDays('2024-H1')).toEqual({ from: '2024-01-01', to: '2024-06-30' });
    expect(halfYearDays('2024-H2')).toEqual({ from: '2024-07-01', to: '2024-12-31' });
  });
});

describe('figures in words', () => {
  it('a share close to all cars: a tenth more, and never rounded up to all', () => {
    expect(freeShare(0.9968)).toBe('99.7\u202f%');
    expect(freeShare(0.968)).toBe('97\u202f%');
    expect(freeShare(1)).toBe('100\u202f%');
  });

  it('claims expected: whole from ten on', () => {
    expect(expectedText(40.1)).toBe('40');
    expect(expectedText(3.44)).toBe('3.4');
  });

  it('a p-value: no more figures than it deserves', () => {
    expect(pText(0.00016)).toBe('p\u00a0<\u00a00.001');
    expect(pText(0.034)).toBe('p\u00a0=\u00a00.03');
    expect(pText(0.42)).toBe('p\u00a0=\u00a00.4');
  });
});
