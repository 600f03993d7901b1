import { naturalSides } from '#shared/domain/zone-sides';
import { SIDES, ZONES } from '#shared/domain/vocabulary';
import { anchorOf } from './anchors';
import { BODY } from './car-lines';
import { CAR, cornersOf } from './outline';
import { alongTheCar, isSided, shapesOf, USUAL_PLACES } from './place-shapes';
import { distanceTo } from './reach';

const EVERY = ZONES.flatMap((zone) => SIDES.map((side) => ({ zone, side })));

describe('place shapes', () => {
  it.each(EVERY)(
    'shapesOf, given $zone and $side, has a shape, inside the body',
    ({ zone, side }) => {
      const shapes = shapesOf(zone, side);
      expect(shapes.length).toBeGreaterThan(0);
      for (const corner of shapes.flatMap(cornersOf)) expect(distanceTo(BODY, corner)).toBe(0);
    },
  );

  it.each(ZONES)(
    'shapesOf, given %s left and right, lies on that side and mirrors the other',
    (zone) => {
      const left = shapesOf(zone, 'left').flatMap(cornersOf);
      const right = shapesOf(zone, 'right').flatMap(cornersOf);
      expect(Math.max(...left.map(([, y]) => y))).toBeLessThanOrEqual(CAR.middle);
      expect(Math.min(...right.map(([, y]) => y))).toBeGreaterThanOrEqual(CAR.middle);
      right.forEach(([x, y], index) => {
        expect(x).toBeCloseTo(left[index]![0], 1);
        expect(CAR.height - y).toBeCloseTo(left[index]![1], 1);
      });
    },
  );

  it.each(ZONES)(
    'shapesOf, given the centre of %s, reaches over the middle to both sides',
    (zone) => {
      const ys = shapesOf(zone, 'centre')
        .flatMap(cornersOf)
        .map(([, y]) => y);
      expect(Math.min(...ys)).toBeLessThan(CAR.middle);
      expect(Math.max(...ys)).toBeGreaterThan(CAR.middle);
    },
  );

  it('isSided, given every zone, agrees with the sides that the trade gives it', () => {
    for (const zone of ZONES) expect(isSided(zone)).toBe(naturalSides(zone).length === 2);
  });

  it.each(USUAL_PLACES)(
    'anchorOf, given $zone $side, lies inside a shape of that place',
    ({ zone, side }) => {
      const distances = shapesOf(zone, side).map((shape) =>
        distanceTo(shape, anchorOf(zone, side)),
      );
      expect(Math.min(...distances)).toBe(0);
    },
  );

  it('alongTheCar, given all usual places, goes down the left side, the middle, the right side', () => {
    const sides = alongTheCar(USUAL_PLACES).map(({ side }) => side);
    expect(sides.join(' ')).toMatch(/^(left ){10}(centre ){5}(right ?){10}$/);
    expect(alongTheCar(USUAL_PLACES)[0]).toEqual({ zone: 'front_wing', side: 'left' });
  });
});
