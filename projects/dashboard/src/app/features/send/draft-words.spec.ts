import type { DeviceDraft } from '../../core/drafts/device-draft';
import { draftWords } from './draft-words';

const draft = (more: Partial<DeviceDraft> = {}): DeviceDraft => ({
  id: 'd1',
  personId: 7,
  branch: 'HAV',
  jobRef: '0417',
  content: { vehicle: { make: 'Velder', model: 'Tessock', firstRegistered: '2009-05' } },
  photos: [],
  corrects: undefined,
  keptAs: undefined,
  state: 'editing',
  problem: undefined,
  step: 3,
  changedAt: '2026-02-02T10:00:00.000Z',
  ...more,
});

describe('draftWords', () => {
  it('of a job being written, given its step, says where it stands', () => {
    expect(draftWords(draft())).toEqual({
      title: 'Velder Tessock 2009, job 0417',
      state: 'being written: findings',
      tone: 'quiet',
      act: 'Go on',
    });
    expect(draftWords(draft({ corrects: '"r2"' })).state).toBe(
      'a correction, being written: findings',
    );
    expect(draftWords(draft({ keptAs: '"u1"' })).state).toBe(
      'being written: findings; colleagues see what was last kept',
    );
    expect(draftWords(draft({ content: {}, jobRef: '' })).title).toBe('A car not named yet');
  });

  it('of a job refused, given why, says it and asks to mend it', () => {
    const problem = { status: 422, sentence: 'The day finished lies ahead.', fields: [] };
    expect(draftWords(draft({ state: 'refused', problem }))).toMatchObject({
      state: 'refused: The day finished lies ahead.',
      tone: 'trouble',
      act: 'Mend it',
    });
  });

  it('of a job sent, given photos still to go and refused ones, counts both', () => {
    const photos = [
      { id: 'a', finding: null, state: 'here' },
      { id: 'b', finding: null, state: 'refused', problem: 'It is no photo.' },
      { id: 'c', finding: null, state: 'sent' },
    ] as const;
    expect(draftWords(draft({ state: 'sent', photos })).state).toBe(
      'sent, 1 photo still to go, 1 photo refused: It is no photo.',
    );
    expect(draftWords(draft({ state: 'sent' }))).toMatchObject({ state: 'sent', tone: 'tide' });
    expect(draftWords(draft({ state: 'sent', corrects: '"r2"' })).state).toBe('a correction, sent');
  });
});
