import { SIDES, ZONES, type Side, type Zone } from '#shared/domain/vocabulary';
import { shapesOf } from './geometry/place-shapes';
import { paintAreas } from './paint-areas';

const at = (zone: Zone, side: Side) => ({ zone, side });

describe('paintAreas', () => {
  it('given left and right of a zone, paints each on its own shapes', () => {
    const { painted } = paintAreas([at('sill_outer', 'left'), at('sill_outer', 'right')]);
    expect(painted.map(({ shapes }) => shapes)).toEqual([
      shapesOf('sill_outer', 'left'),
      shapesOf('sill_outer', 'right'),
    ]);
  });

  it('given only the centre of a zone on both sides, paints both', () => {
    const [only] = paintAreas([at('rear_arch', 'centre')]).painted;
    expect(only!.sides).toEqual(['left', 'right']);
  });

  it('given left and the centre of such a zone, leaves left to its own and paints the other side', () => {
    const { painted } = paintAreas([at('rear_arch', 'centre'), at('rear_arch', 'left')]);
    expect(painted.map(({ area, sides }) => [area.side, sides])).toEqual([
      ['left', ['left']],
      ['centre', ['right']],
    ]);
  });

  it('given left, right and the centre of the floor, has the tunnel for the centre', () => {
    const { painted, inWords } = paintAreas(SIDES.map((side) => at('floor', side)));
    expect(inWords).toEqual([]);
    expect(painted.at(-1)!.shapes).toEqual(shapesOf('floor', 'centre'));
  });

  it('given the centre of a zone on the middle, paints it whole, and in half beside an exact half', () => {
    expect(paintAreas([at('tailgate', 'centre')]).painted[0]!.shapes).toEqual(
      shapesOf('tailgate', 'centre'),
    );
    const beside = paintAreas([at('tailgate', 'centre'), at('tailgate', 'right')]).painted;
    expect(beside.map(({ sides }) => sides)).toEqual([['right'], ['left']]);
  });

  it('given all 45 places, shows each on the picture or in words, none twice', () => {
    const all = ZONES.flatMap((zone) => SIDES.map((side) => at(zone, side)));
    const { painted, inWords } = paintAreas(all);
    expect(new Set([...painted.map(({ area }) => area), ...inWords]).size).toBe(45);
    expect(inWords.every(({ zone, side }) => side === 'centre' && zone !== 'floor')).toBe(true);
    const shapes = painted.flatMap((each) => each.shapes);
    expect(new Set(shapes).size).toBe(shapes.length);
  });
});
