import { closedHalf, cornersOf, joined, mirrored } from './outline';

describe('outline', () => {
  it('mirrored, given a path on the left side, lies as far from the middle line on the right', () => {
    expect(mirrored('M10 20 L30 20 C40 20 40 30 40 40 Z')).toBe(
      'M10 370 L30 370 C40 370 40 360 40 350 Z',
    );
  });

  it('mirrored, given it twice, is the path it was', () => {
    const path = 'M10 20 L30 20 C40 20 40 30 40 40 Z';
    expect(mirrored(mirrored(path))).toBe(path);
  });

  it('joined, given a half, goes back over the other side and closes where it began', () => {
    expect(joined('M10 195 L10 100 C10 90 20 90 30 100 L30 195')).toBe(
      'M10 195 L10 100 C10 90 20 90 30 100 L30 195 L30 290 C20 300 10 300 10 290 L10 195 Z',
    );
  });

  it('closedHalf, given a half, is closed along the middle line', () => {
    expect(cornersOf(closedHalf('M10 195 L10 100 L30 195')).map(([, y]) => y)).toEqual([
      195, 100, 195,
    ]);
  });

  it('cornersOf, given a curve, follows it within its ends', () => {
    const corners = cornersOf('M0 0 C0 10 10 10 10 0');
    expect(corners).toHaveLength(7);
    expect(corners[3]).toEqual([5, 7.5]);
  });
});
