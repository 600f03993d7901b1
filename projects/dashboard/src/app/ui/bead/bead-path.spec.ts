import { beadPaths } from './bead-path';

describe('beadPaths', () => {
  it('without a width draws nothing', () => {
    expect(beadPaths(0)).toEqual({ body: '', cuts: '' });
  });

  it('of a word’s width has whole lobes of about 9.5 and a cut between every two', () => {
    const { body, cuts } = beadPaths(76);
    expect(body.match(/Q/g)).toHaveLength(8);
    expect(cuts.match(/M/g)).toHaveLength(7);
    expect(body.startsWith('M0 0H76')).toBe(true);
  });

  it('of a very short run is still one lobe', () => {
    expect(beadPaths(4).body.match(/Q/g)).toHaveLength(1);
  });
});
