import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { classOf, CLASS_BOUNDS, lookOf } from './share-scale';

describe('share scale', () => {
  it.each([
    [0, 0],
    [0.0249, 0],
    [0.025, 1],
    [0.04999, 1],
    [0.05, 2],
    [0.1, 3],
    [0.199, 3],
    [0.2, 4],
    [0.39999, 4],
    [0.4, 5],
    [1, 5],
  ])('classOf, given %p, is %p', (share, expected) => {
    expect(classOf(share)).toBe(expected);
  });

  it('classOf, given a share that rounds up to a bound, stays in the class of the unrounded share', () => {
    expect(classOf(0.0996)).toBe(2);
  });

  it('CLASS_BOUNDS, after the first step, double', () => {
    for (let step = 2; step < CLASS_BOUNDS.length; step += 1) {
      expect(CLASS_BOUNDS[step]).toBe(2 * CLASS_BOUNDS[step - 1]!);
    }
  });

  it('lookOf, given no share, is never a colour of the scale', () => {
    expect(lookOf(null)).toBe('few');
    expect(lookOf(0)).toBe('step-0');
  });

  // Greyscale print and eyes that see no colour have only the lightness to go by.
  it.each(['light', 'dark'])(
    'the scale of the %s theme goes one way in lightness, in steps of 6 or more',
    (theme) => {
      const lightness = scaleOf(theme).map(lightnessOf);
      const steps = lightness.slice(1).map((value, index) => value - lightness[index]!);
      const direction = theme === 'light' ? -1 : 1;
      expect(lightness).toHaveLength(6);
      for (const step of steps) expect(step * direction).toBeGreaterThan(6);
    },
  );
});

/** The scale as the tokens have it: the mixin of a theme, its steps in order. */
function scaleOf(theme: string): string[] {
  const tokens = readFileSync(join(__dirname, '../../theme/_tokens.scss'), 'utf8');
  const mixin = tokens.split(`@mixin ${theme} {`)[1]!.split('\n}')[0]!;
  return [...mixin.matchAll(/--us-scale-\d: (#[0-9a-f]{6});/g)].map(([, hex]) => hex!);
}

/** CIE 1976 lightness of an sRGB colour (IEC 61966-2-1 for its luminance, CIE 15 for the lightness). */
function lightnessOf(hex: string): number {
  const [red, green, blue] = [1, 3, 5].map((from) => {
    const value = parseInt(hex.slice(from, from + 2), 16) / 255;
    return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4;
  });
  const luminance = 0.2126 * red! + 0.7152 * green! + 0.0722 * blue!;
  return luminance > 216 / 24389 ? 116 * Math.cbrt(luminance) - 16 : (24389 / 27) * luminance;
}
