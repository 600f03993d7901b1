import { placesOf, tickedBranches } from './places';

const REGIONS = [
  {
    code: 'NO',
    name: 'North',
    branches: [
      { code: 'HAV', name: 'Havnsund' },
      { code: 'TAN', name: 'Tangvarp' },
    ],
  },
  { code: 'SO', name: 'South', branches: [{ code: 'ULV', name: 'Ulvmark' }] },
  { code: 'EM', name: 'Empty', branches: [] },
];

describe('tickedBranches', () => {
  it('of nothing chosen ticks nothing', () => {
    expect(tickedBranches(REGIONS, { regions: [], branches: [] })).toEqual(new Set());
  });

  it('of a region ticks its branches', () => {
    expect(tickedBranches(REGIONS, { regions: ['NO'], branches: [] })).toEqual(
      new Set(['HAV', 'TAN']),
    );
  });

  it('of a region and a branch outside it ticks nothing, as the server intersects them', () => {
    expect(tickedBranches(REGIONS, { regions: ['NO'], branches: ['ULV'] })).toEqual(new Set());
  });
});

describe('placesOf', () => {
  it('of all or none says nothing: that is everything', () => {
    expect(placesOf(REGIONS, new Set())).toEqual({ regions: [], branches: [] });
    expect(placesOf(REGIONS, new Set(['HAV', 'TAN', 'ULV']))).toEqual({
      regions: [],
      branches: [],
    });
  });

  it('of whole regions says the regions', () => {
    expect(placesOf(REGIONS, new Set(['TAN', 'HAV']))).toEqual({ regions: ['NO'], branches: [] });
  });

  it('of part of a region says the branches', () => {
    expect(placesOf(REGIONS, new Set(['ULV', 'HAV']))).toEqual({
      regions: [],
      branches: ['HAV', 'ULV'],
    });
  });
});
