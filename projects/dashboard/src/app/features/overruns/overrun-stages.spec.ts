import { STAGES } from '#shared/domain/vocabulary';
import { overrunAnswer, stageGroups } from '../../testing/overrun-answers';
import { stagePictures } from './overrun-stages';
import type { OverrunWords } from './overrun-words';

const words: OverrunWords = { branchName: (c) => c, regionName: (c) => c, packageName: (c) => c };
const pictures = stagePictures(overrunAnswer('stage', stageGroups()), words);
const plain = (text: string): string => text.replaceAll('\u202f', ' ');

describe('stagePictures', () => {
  it('minutes: estimated plus the seven stages is worked, to the minute', () => {
    const { rows } = pictures.minutes;
    expect(rows.map(({ key }) => key)).toEqual(['expected', ...STAGES, 'kept']);
    const [estimated, ...rest] = rows.map(({ value }) => value);
    const worked = rest.pop()!;
    expect(rest.reduce((sum, over) => sum + over, estimated!)).toBe(worked);
  });

  it('time over is a loss, time won back a gain; the largest stands in 600', () => {
    const byKey = Object.fromEntries(pictures.minutes.rows.map((row) => [row.key, row]));
    expect(byKey['repair']).toMatchObject({ role: 'loss', text: '+16,000', strong: true });
    expect(byKey['mask']).toMatchObject({ role: 'gain', text: '−500', strong: false });
    expect(byKey['dry']).toMatchObject({ text: '0', strong: false });
  });

  it('ratios: above only where the whole interval misses the estimate', () => {
    const byKey = Object.fromEntries(pictures.ratios.rows.map((row) => [row.key, row]));
    expect(byKey['strip']).toMatchObject({ stand: 'above', word: 'above' });
    expect(byKey['mask']).toMatchObject({ stand: 'as_expected', word: '' });
  });

  it('a stage that no estimate names: hatched, and says so', () => {
    const repair = pictures.ratios.rows.find(({ key }) => key === 'repair')!;
    expect(repair).toMatchObject({ value: null, text: 'never estimated' });
  });

  it('the text alternatives: every stage with its figure', () => {
    expect(plain(pictures.ratios.summary)).toContain('strip +15 % (11–19 %)');
    expect(pictures.ratios.summary).toContain('repair never estimated');
    expect(pictures.minutes.summary).toContain('120,000 minutes estimated, 144,000 worked');
  });
});
