import type { LiveEvent } from '#shared/contracts/live';
import { liveSentence } from './live-sentence';

const NAMES: Record<string, string> = { HAV: 'Havnsund', TAN: 'Tangvarp', ULV: 'Ulvmark' };
const tell = (...events: LiveEvent[]) =>
  liveSentence(events, { time: '08:12', branchName: (code) => NAMES[code] ?? code });
const jobs = (branch: string, count: number, added = count): LiveEvent => ({
  kind: 'jobs',
  branch,
  count,
  added,
});

describe('liveSentence', () => {
  it('given one new job, says where it came from and when', () => {
    expect(tell(jobs('HAV', 1))).toBe('1 new job from Havnsund, 08:12');
  });

  it('given several changes of a branch, adds them up and tells new from changed', () => {
    expect(tell(jobs('HAV', 3, 2), jobs('HAV', 1))).toBe(
      '3 new jobs and 1 changed job from Havnsund, 08:12',
    );
  });

  it('given more than one kind and two branches, names both', () => {
    const signal = { kind: 'signals', branch: 'TAN', count: 2, added: 0 } as const;
    expect(tell(jobs('HAV', 2), signal)).toBe(
      '2 new jobs and 2 changed signals from Havnsund and Tangvarp, 08:12',
    );
  });

  it('given three branches, counts them', () => {
    expect(tell(jobs('HAV', 2), jobs('TAN', 5), jobs('ULV', 1))).toBe(
      '8 new jobs from 3 branches, 08:12',
    );
  });
});
