import type { DeviceDraft } from './device-draft';
import { mergeChange } from './merge-change';

const seen: DeviceDraft = {
  id: 'a',
  personId: 7,
  branch: 'HAV',
  jobRef: '0417',
  content: { package: 'full', notes: 'seat out' },
  photos: [],
  corrects: undefined,
  keptAs: undefined,
  state: 'editing',
  problem: undefined,
  step: 0,
  changedAt: '2026-02-02T06:30:00Z',
};

describe('mergeChange', () => {
  it('given nothing changed elsewhere, is the change', () => {
    const content = { package: 'cavity', notes: 'seat out' };
    const { draft, clash } = mergeChange(seen, seen, { content, step: 3 });
    expect(draft).toEqual({ ...seen, content, step: 3 });
    expect(clash).toBe(false);
  });

  it('given another field changed elsewhere, keeps both', () => {
    const kept = {
      ...seen,
      jobRef: '0418',
      content: { ...seen.content, completedOn: '2026-02-02' },
    };
    const { draft, clash } = mergeChange(kept, seen, {
      content: { package: 'cavity', notes: 'seat out' },
    });
    expect(draft.jobRef).toBe('0418');
    expect(draft.content).toEqual({
      package: 'cavity',
      notes: 'seat out',
      completedOn: '2026-02-02',
    });
    expect(clash).toBe(false);
  });

  it('given the same field changed otherwise elsewhere, tells of the clash', () => {
    const kept = { ...seen, content: { ...seen.content, notes: 'rust at the seam' } };
    const content = { package: 'full', notes: 'seat out, back in' };
    const { draft, clash } = mergeChange(kept, seen, { content });
    expect(draft.content.notes).toBe('seat out, back in');
    expect(clash).toBe(true);
  });

  it('given the same field changed alike elsewhere, sees no clash', () => {
    const content = { package: 'cavity', notes: 'seat out' };
    expect(mergeChange({ ...seen, content }, seen, { content }).clash).toBe(false);
  });

  it('given a field taken out, takes it out', () => {
    const { draft } = mergeChange(seen, seen, { content: { package: 'full' } });
    expect(draft.content).toEqual({ package: 'full' });
  });
});
