import { rotAnswer, rotBand } from '../../testing/rot-answers';
import { ageFrom, bandOf } from './age-choice';

describe('ageFrom', () => {
  const { bands } = rotAnswer();

  it('a known age in the URL, whatever its cars: that age', () => {
    expect(ageFrom('20+', bands)).toBe('20+');
  });

  it('none or no age in the URL, several with enough cars: the one with most cars with rot', () => {
    expect(ageFrom(undefined, bands)).toBe('10-14');
    expect(ageFrom('12', bands)).toBe('10-14');
  });

  it('no age in the URL, most rot among too few cars: an age with enough cars all the same', () => {
    expect(ageFrom(undefined, [rotBand('0-4', 80, 1), rotBand('20+', 4, 4)])).toBe('0-4');
  });

  it('no age in the URL, every age with too few cars: the one with most rot', () => {
    expect(ageFrom(undefined, [rotBand('0-4', 3, 0), rotBand('20+', 4, 4)])).toBe('20+');
  });
});

describe('bandOf', () => {
  it('an age without a car, not in the answer: nothing of anything', () => {
    expect(bandOf(rotAnswer(), '0-4')).toMatchObject({ cars: 0, withRot: 0, share: null });
  });
});
