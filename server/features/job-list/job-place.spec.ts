import type { ListPlace } from '#db/queries/job-list';
import { Refusal } from '#shared/domain/refusal';
import { cursorOf, placeOf } from '../../http/list-cursor';
import { jobPlace } from './job-place';

const PLACE: ListPlace = {
  key: -4200,
  completedOn: '2026-01-28',
  branch: 'AAA',
  jobRef: 'Ref/ü "7"',
};

const MARGIN = { sort: 'margin', ...PLACE };

describe('jobPlace', () => {
  it('given a cursor of the same sort, finds its place again', () => {
    expect(placeOf(cursorOf(MARGIN), jobPlace('margin'))).toEqual(MARGIN);
    expect(cursorOf(MARGIN)).toMatch(/^[\w-]+$/);
  });

  it('given none, begins at the start', () => {
    expect(placeOf(undefined, jobPlace('margin'))).toBeNull();
  });

  it.each([
    ['of another sort', cursorOf({ ...PLACE, sort: 'overrun' })],
    ['that is empty', ''],
    ['that is no JSON', 'AAAA'],
    ['of another list', Buffer.from('{"sort":"margin","id":7}').toString('base64url')],
    ['with more in it', Buffer.from(json({ more: 1 })).toString('base64url')],
    ['with a text for a number', Buffer.from(json({ key: '7' })).toString('base64url')],
    ['with a day that is none', Buffer.from(json({ completedOn: '9' })).toString('base64url')],
    ['with null', Buffer.from('null').toString('base64url')],
  ])('given a cursor %s, refuses it (rule 67)', (_case, cursor) => {
    expect(() => placeOf(cursor, jobPlace('margin'))).toThrow(Refusal);
    try {
      placeOf(cursor, jobPlace('margin'));
    } catch (error) {
      expect((error as Refusal).problems.map(({ path }) => path)).toEqual(['/query/cursor']);
    }
  });
});

function json(over: Record<string, unknown>): string {
  return JSON.stringify({ sort: 'margin', ...PLACE, ...over });
}
