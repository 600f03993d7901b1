import { layOutMarks } from './marks-layout';
import type { UndersideFinding } from './underside-input';

const car = { x: 0, y: 0, width: 328, height: 128 };
const size = { width: 21, height: 21 };
const finding = (ref: string, more: Partial<UndersideFinding> = {}): UndersideFinding => ({
  ref,
  zone: 'sill_outer',
  side: 'left',
  seenAs: 'bubbling',
  structural: true,
  ...more,
});

describe('layOutMarks', () => {
  it('given findings, numbers them from 1 in the order given', () => {
    const marks = layOutMarks([finding('b'), finding('a', { zone: 'tailgate' })], car, size);
    expect(marks.map(({ number }) => number)).toEqual([1, 2]);
  });

  it('given nine in the same place, lays none on another and ties those that moved', () => {
    const marks = layOutMarks(
      'abcdefghi'.split('').map((ref) => finding(ref)),
      car,
      size,
    );
    marks.forEach((one, index) => {
      for (const other of marks.slice(index + 1)) {
        const apart = Math.abs(one.x - other.x) >= 21 || Math.abs(one.y - other.y) >= 21;
        expect(apart).toBe(true);
      }
    });
    expect(marks[0]!.leader).toBeNull();
    expect(marks[1]!.leader).toEqual([marks[0]!.x, marks[0]!.y]);
  });

  it('given load-bearing rot, is dangerous when it was left on the car and only then', () => {
    const left = { action: 'deferred' } as const;
    const marks = layOutMarks(
      [
        finding('a', left),
        finding('b', { ...left, structural: false }),
        finding('c', { ...left, seenAs: 'surface' }),
        finding('d', { ...left, seenAs: 'surface', workedAs: 'holed' }),
        finding('e', { action: 'patched' }),
        finding('f', { action: 'declined' }),
      ],
      car,
      size,
    );
    expect(marks.map(({ dangerous }) => dangerous)).toEqual([
      true,
      false,
      false,
      true,
      false,
      true,
    ]);
    expect(marks[3]!.condition).toBe('holed');
  });
});
