import { scopeFromUrl, scopeToUrl } from './scope-url';

describe('scopeFromUrl', () => {
  it('of an empty URL chooses nothing', () => {
    expect(scopeFromUrl({})).toEqual({
      regions: [],
      branches: [],
      packages: [],
      bodyTypes: [],
      week: undefined,
      asOf: undefined,
      period: undefined,
    });
  });

  it('of one and of several values reads lists, each value once', () => {
    const scope = scopeFromUrl({ branch: 'HAV', region: ['NO', 'SO', 'NO'], bodyType: ['van'] });
    expect(scope.branches).toEqual(['HAV']);
    expect(scope.regions).toEqual(['NO', 'SO']);
    expect(scope.bodyTypes).toEqual(['van']);
  });

  it('of words that make no sense leaves them out', () => {
    const scope = scopeFromUrl({
      bodyType: ['van', 'boat'],
      week: '2026-W60',
      asOf: '2026-06-31',
      from: '2026-02-30',
      to: '2026-03-01',
      last: '0',
    });
    expect(scope.bodyTypes).toEqual(['van']);
    expect(scope.week).toBeUndefined();
    expect(scope.asOf).toBeUndefined();
    expect(scope.period).toBeUndefined();
  });

  it('of two dates in order reads a period, in the wrong order none', () => {
    expect(scopeFromUrl({ from: '2026-01-01', to: '2026-01-01' }).period).toEqual({
      kind: 'dates',
      from: '2026-01-01',
      to: '2026-01-01',
    });
    expect(scopeFromUrl({ from: '2026-01-02', to: '2026-01-01' }).period).toBeUndefined();
  });

  it.each([
    ['26', 26],
    ['1', 1],
    ['260', 260],
  ])('of last=%s reads that many weeks', (last, weeks) => {
    expect(scopeFromUrl({ last }).period).toEqual({ kind: 'last', weeks });
  });

  it.each(['261', '2.5', '-1', 'x', ''])('of last=%s reads nothing', (last) => {
    expect(scopeFromUrl({ last }).period).toBeUndefined();
  });
});

describe('scopeToUrl', () => {
  it('of parts not given mentions none of them', () => {
    expect(scopeToUrl({ branches: ['HAV'] })).toEqual({ branch: ['HAV'] });
  });

  it('of an emptied part takes it out of the URL', () => {
    expect(
      scopeToUrl({ packages: [], week: undefined, asOf: undefined, period: undefined }),
    ).toEqual({
      package: null,
      week: null,
      asOf: null,
      last: null,
      from: null,
      to: null,
    });
  });

  it('of a period replaces the other kind of period', () => {
    expect(scopeToUrl({ period: { kind: 'last', weeks: 13 } })).toEqual({
      last: '13',
      from: null,
      to: null,
    });
  });

  it('there and back again is the same scope', () => {
    const scope = scopeFromUrl({
      region: ['NO'],
      branch: ['HAV', 'TAN'],
      package: ['full'],
      bodyType: ['van', 'classic'],
      week: '2026-W05',
      asOf: '2025-12-31',
      from: '2026-01-01',
      to: '2026-02-01',
    });
    expect(scopeFromUrl(scopeToUrl(scope))).toEqual(scope);
  });
});
