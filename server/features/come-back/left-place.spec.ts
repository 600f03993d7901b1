import type { ComeBackPlace } from '#db/queries/come-back';
import { Refusal } from '#shared/domain/refusal';
import { cursorOf, placeOf } from '../../http/list-cursor';
import { leftPlace } from './left-place';

const PLACE: ComeBackPlace = {
  danger: 0,
  completedOn: '2026-01-28',
  branch: 'AAA',
  jobRef: 'Ref/ü "7"',
  place: 44,
  ref: 'sill_outer/left/1',
};
const packed = (over: object): string =>
  Buffer.from(JSON.stringify({ ...PLACE, ...over })).toString('base64url');

describe('leftPlace', () => {
  it('given a cursor of the list, finds its place again', () => {
    expect(placeOf(cursorOf(PLACE), leftPlace)).toEqual(PLACE);
    expect(cursorOf(PLACE)).toMatch(/^[\w-]+$/);
  });

  it('given none, begins at the start', () => {
    expect(placeOf(undefined, leftPlace)).toBeNull();
  });

  it.each([
    ['that is empty', ''],
    ['that is no JSON', 'AAAA'],
    ['with null', Buffer.from('null').toString('base64url')],
    ['with more in it', packed({ more: 1 })],
    ['with less in it', packed({ ref: undefined })],
    ['with a text for a number', packed({ danger: '1' })],
    ['with a day that is none', packed({ completedOn: '2026-02-30' })],
    ['of the list of jobs', Buffer.from('{"sort":"margin","key":7}').toString('base64url')],
  ])('given a cursor %s, refuses it (rule 67)', (_case, cursor) => {
    expect(() => placeOf(cursor, leftPlace)).toThrow(Refusal);
  });
});
