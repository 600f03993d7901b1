import { openedUpSentence } from './opened-up';

const NONE = { share: null, lower: null, upper: null };

describe('openedUpSentence', () => {
  it('enough bubbles: counts, share and interval', () => {
    const said = openedUpSentence({
      worked: 312,
      holed: 178,
      share: 0.5705,
      lower: 0.5148,
      upper: 0.6243,
    });
    expect(said.replaceAll('\u202f', ' ')).toBe(
      'Of 312 bubbles worked, 178 opened into holes: 57 % (51–62 %).',
    );
  });

  it('fewer than 5, one of them a hole: counts, and from when a share is shown', () => {
    expect(openedUpSentence({ worked: 3, holed: 1, ...NONE })).toBe(
      'Of 3 bubbles worked, 1 opened into a hole: too few for a share, which is shown from 5 on.',
    );
  });

  it('none: says so', () => {
    expect(openedUpSentence({ worked: 0, holed: 0, ...NONE })).toContain('No bubble');
  });
});
