import { box } from './outline';
import { areaOf, distanceTo, withinReach } from './reach';

const large = { name: 'large', shapes: [box(0, 0, 100, 100, 0)] };
const small = { name: 'small', shapes: [box(40, 40, 10, 10, 0)] };
const far = { name: 'far', shapes: [box(130, 0, 10, 100, 0)] };

describe('reach', () => {
  it('distanceTo, given a point inside, at and off a box, is 0, 0 and the way to its edge', () => {
    expect(distanceTo(large.shapes[0]!, [50, 50])).toBe(0);
    expect(distanceTo(large.shapes[0]!, [100, 50])).toBe(0);
    expect(distanceTo(large.shapes[0]!, [103, 104])).toBeCloseTo(5);
  });

  it('areaOf, given a box, is its sides multiplied', () => {
    expect(areaOf(large.shapes[0]!)).toBe(10_000);
  });

  it('withinReach, given a touch on two that overlap, offers the smaller first and the far one not', () => {
    const names = withinReach([large, far, small], [45, 45], 23).map(({ name }) => name);
    expect(names).toEqual(['small', 'large']);
  });

  it('withinReach, given a touch beside one, offers it by its distance', () => {
    expect(withinReach([large, far], [112, 50], 23).map(({ name }) => name)).toEqual([
      'large',
      'far',
    ]);
    expect(withinReach([large, far], [112, 50], 11)).toEqual([]);
  });
});
