import { ageBandOf, filterWords, flagOf, sortOf } from './job-filters';

const NONE = {
  q: undefined,
  make: undefined,
  model: undefined,
  ageBand: undefined,
  unbilled: undefined,
  hasRot: undefined,
  hasEstimate: undefined,
};

describe('job filters', () => {
  it('of words a URL should not hold are no filters', () => {
    expect(flagOf('yes')).toBeUndefined();
    expect(ageBandOf('5-10')).toBeUndefined();
    expect(sortOf('price')).toBe('completed');
  });

  it('in force are said in words with what lifts them', () => {
    expect(filterWords({ ...NONE, make: 'Velder', model: 'Tessock', unbilled: true })).toEqual([
      { words: 'Velder Tessock', without: { make: null, model: null } },
      { words: 'not billed', without: { unbilled: null } },
    ]);
  });

  it('none in force says nothing', () => {
    expect(filterWords(NONE)).toEqual([]);
  });
});
