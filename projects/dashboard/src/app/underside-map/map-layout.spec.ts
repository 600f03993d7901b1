import { SIDES, ZONES } from '#shared/domain/vocabulary';
import { USUAL_PLACES } from './geometry/place-shapes';
import { layOutMap, LABELLED_FROM } from './map-layout';
import { paintAreas } from './paint-areas';
import type { UndersideArea, UndersidePlace } from './underside-input';

const withShare = (place: UndersidePlace): UndersideArea => ({ ...place, share: 0.1, cars: 50 });
const usual = paintAreas(USUAL_PLACES.map(withShare)).painted;

describe('layOutMap', () => {
  it.each([LABELLED_FROM, 906, 1400])(
    'given all zones and a width of %p, labels each once inside it',
    (width) => {
      const { labels, height } = layOutMap(usual, width);
      expect(labels).toHaveLength(USUAL_PLACES.length);
      for (const { x, y } of labels) {
        expect(x).toBeGreaterThan(0);
        expect(x).toBeLessThan(width);
        expect(y).toBeGreaterThan(0);
        expect(y).toBeLessThan(height);
      }
    },
  );

  it.each(['above', 'below'])(
    'given the row %s, spaces its eight labels evenly, leaders in one order',
    (row) => {
      const { labels, car } = layOutMap(usual, 906);
      const inRow = labels
        .filter(({ y }) => (row === 'above' ? y < car.y : y > car.y + car.height))
        .sort((a, b) => a.x - b.x);
      expect(inRow).toHaveLength(8);
      const gaps = inRow.slice(1).map(({ x }, index) => x - inRow[index]!.x);
      for (const gap of gaps) expect(gap).toBeCloseTo(gaps[0]!);
      expect(gaps[0]).toBeGreaterThanOrEqual(70);
      const ends = inRow.map(({ leader }) => leader!.to[0]);
      expect(ends).toEqual([...ends].sort((a, b) => a - b));
    },
  );

  it('given left above and right below, each leader ends on its own side of the car', () => {
    const { labels, car } = layOutMap(usual, 906);
    const middle = car.y + car.height / 2;
    for (const { y, leader } of labels.filter(({ key }) => !key.endsWith('centre'))) {
      if (leader) expect(y < middle).toBe(leader.to[1] < middle);
    }
  });

  it('given a phone, has no labels and the car as wide as the picture', () => {
    const { labels, car } = layOutMap(usual, 328);
    expect(labels).toEqual([]);
    expect(car.width).toBe(328);
  });

  it('given a side that the car does not have there by its build, says it in the label', () => {
    const odd = paintAreas([withShare({ zone: 'rear_arch', side: 'centre' })]).painted;
    const { labels } = layOutMap(odd, 906);
    expect(labels.map(({ name }) => name)).toEqual([
      ['rear', 'arch', 'centre'],
      ['rear', 'arch', 'centre'],
    ]);
  });

  it('given too few cars, says so in place of a share', () => {
    const few = paintAreas([
      { zone: 'floor', side: 'left', share: null, cars: 3 } as const,
    ]).painted;
    expect(layOutMap(few, 906).labels[0]).toMatchObject({
      told: 'few',
      share: 'too few',
      on: 'few',
    });
  });

  it('given all 45 places, labels all that is painted', () => {
    const all = ZONES.flatMap((zone) => SIDES.map((side) => withShare({ zone, side })));
    const { painted } = paintAreas(all);
    const keys = layOutMap(painted, 906).labels.map(({ key }) => key);
    expect(new Set(keys).size).toBe(painted.flatMap(({ sides }) => sides).length);
  });
});
