import {
  ageBandOf,
  filterWords,
  flagOf,
  type JobFilters,
  sideOf,
  sortOf,
  useOf,
  zoneOf,
} from './job-filters';

const NONE = {
  q: undefined,
  make: undefined,
  model: undefined,
  ageBand: undefined,
  unbilled: undefined,
  hasRot: undefined,
  hasEstimate: undefined,
  zone: undefined,
  side: undefined,
  product: undefined,
  use: undefined,
};
const say = (filters: Partial<JobFilters>) =>
  filterWords({ ...NONE, ...filters }, (code) => `${code} wax`);

describe('job filters', () => {
  it('of words a URL should not hold are no filters', () => {
    expect(flagOf('yes')).toBeUndefined();
    expect(ageBandOf('5-10')).toBeUndefined();
    expect(sortOf('price')).toBe('completed');
    expect(zoneOf('roof')).toBeUndefined();
    expect(sideOf('top')).toBeUndefined();
    expect(useOf('twice')).toBeUndefined();
  });

  it('in force are said in words with what lifts them', () => {
    expect(say({ make: 'Velder', model: 'Tessock', unbilled: true })).toEqual([
      { words: 'Velder Tessock', without: { make: null, model: null } },
      { words: 'not billed', without: { unbilled: null } },
    ]);
  });

  it('none in force says nothing', () => {
    expect(say({})).toEqual([]);
  });

  it('a zone with a side says where the rot is, once, and lifting it lifts the rot as well', () => {
    expect(say({ zone: 'sill_outer', side: 'left', hasRot: true, ageBand: '10-14' })).toEqual([
      { words: 'aged 10–14 years', without: { ageBand: null } },
      {
        words: 'with rot in the outer sill (left)',
        without: { zone: null, side: null, hasRot: null },
      },
    ]);
    expect(say({ zone: 'tailgate' })[0]?.words).toBe('with rot in the tailgate');
  });

  it('a product is said by name, with its use as the share of the norm', () => {
    expect(say({ product: 'CAV' })).toEqual([
      { words: 'with CAV wax', without: { product: null, use: null } },
    ]);
    expect(say({ product: 'CAV', use: 'under' })[0]?.words).toBe(
      'with under 70\u202f% of the norm of CAV wax',
    );
    expect(say({ product: 'CAV', use: 'over' })[0]?.words).toContain('over 130');
  });
});
