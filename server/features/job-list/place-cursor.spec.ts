import type { ListPlace } from '#db/queries/job-list';
import { Refusal } from '#shared/domain/refusal';
import { cursorOf, placeOf } from './place-cursor';

const PLACE: ListPlace = {
  key: -4200,
  completedOn: '2026-01-28',
  branch: 'AAA',
  jobRef: 'Ref/ü "7"',
};

describe('placeOf', () => {
  it('given a cursor of the same sort, finds its place again', () => {
    expect(placeOf(cursorOf(PLACE, 'margin'), 'margin')).toEqual(PLACE);
    expect(cursorOf(PLACE, 'margin')).toMatch(/^[\w-]+$/);
  });

  it('given none, begins at the start', () => {
    expect(placeOf(undefined, 'margin')).toBeNull();
  });

  it.each([
    ['of another sort', cursorOf(PLACE, 'overrun')],
    ['that is empty', ''],
    ['that is no JSON', 'AAAA'],
    ['of another list', Buffer.from('{"sort":"margin","id":7}').toString('base64url')],
    ['with more in it', Buffer.from(json({ more: 1 })).toString('base64url')],
    ['with a text for a number', Buffer.from(json({ key: '7' })).toString('base64url')],
    ['with a day that is none', Buffer.from(json({ completedOn: '9' })).toString('base64url')],
    ['with null', Buffer.from('null').toString('base64url')],
  ])('given a cursor %s, refuses it (rule 67)', (_case, cursor) => {
    expect(() => placeOf(cursor, 'margin')).toThrow(Refusal);
    try {
      placeOf(cursor, 'margin');
    } catch (error) {
      expect((error as Refusal).problems.map(({ path }) => path)).toEqual(['/query/cursor']);
    }
  });
});

function json(over: Record<string, unknown>): string {
  return JSON.stringify({ sort: 'margin', ...PLACE, ...over });
}
