import { ZONES } from './vocabulary';
import { naturalSides, sidesToTell } from './zone-sides';

describe('naturalSides', () => {
  it('given any zone, is left and right or the middle alone', () => {
    const middle = ZONES.filter((zone) => naturalSides(zone).includes('centre'));
    expect(middle).toEqual([
      ...['front_subframe', 'rear_subframe', 'boot_floor', 'slam_panel', 'tailgate'],
    ]);
    for (const zone of ZONES) {
      expect(naturalSides(zone)).toEqual(middle.includes(zone) ? ['centre'] : ['left', 'right']);
    }
  });
});

describe('sidesToTell', () => {
  it('given nothing found, are the natural sides', () => {
    expect(sidesToTell('floor', () => false)).toEqual(['left', 'right']);
    expect(sidesToTell('tailgate', () => false)).toEqual(['centre']);
  });

  it('given something on another side, has that one too, in the order of the vocabulary', () => {
    expect(sidesToTell('floor', (side) => side === 'centre')).toEqual(['left', 'right', 'centre']);
    expect(sidesToTell('tailgate', (side) => side === 'left')).toEqual(['left', 'centre']);
  });
});
