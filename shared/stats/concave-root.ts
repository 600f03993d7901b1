/** A function's value and slope at a point. */
export interface ValueAndSlope {
  value: number;
  slope: number;
}

/** No quantile searched for here lies beyond e^±700 in its own or its odds' scale, short of underflow. */
export const FARTHEST = 700;

/**
 * Where a steadily rising, or steadily falling, concave function crosses 0, between −700 and 700: Newton's steps, which such
 * a function leads to its root from anywhere, each kept inside the bracket found so far. ±700 when the root is beyond.
 *
 * Used on the logarithm of a tail probability over the logarithm (gamma) or log-odds (beta) of the point: both are concave
 * because the densities are log-concave on those scales.
 */
export function concaveRoot(at: (point: number) => ValueAndSlope, start: number): number {
  let low = -FARTHEST;
  let high = FARTHEST;
  let point = Math.min(high, Math.max(low, start));
  for (let round = 0; round < 200; round += 1) {
    const { value, slope } = at(point);
    if (value === 0) return point;
    if (value * slope > 0) high = point;
    else low = point;
    const newton = point - value / slope;
    const next = newton >= low && newton <= high ? newton : (low + high) / 2;
    // Steps shrink quadratically: after one below 1e-9 the next would change no digit.
    if (Math.abs(next - point) < 1e-9) return next;
    point = next;
  }
  return point;
}
