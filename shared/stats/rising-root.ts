/**
 * Where a rising function crosses 0 between two points of opposite sign: secant steps, each kept inside the bracket found so
 * far, halved when one leaves it or the bracket stops shrinking. The first step from `start` is −f(start).
 *
 * Source: J. F. Traub, "Iterative Methods for the Solution of Equations" (1964), safeguarded by bisection.
 */
export function risingRoot(
  f: (point: number) => number,
  [from, to]: readonly [number, number],
  start = (from + to) / 2,
): number {
  let low = from;
  let high = to;
  let point = Math.min(to, Math.max(from, start));
  let value = f(point);
  let next = point - value;
  for (let round = 1; round < 100 && value !== 0; round += 1) {
    if (value > 0) high = point;
    else low = point;
    const outside = !(next > low && next < high);
    if (outside || round % 8 === 0) next = (low + high) / 2;
    if (Math.abs(next - point) < 1e-12 * (1 + Math.abs(point))) return next;
    const nextValue = f(next);
    const slope = (nextValue - value) / (next - point);
    point = next;
    value = nextValue;
    next = point - value / slope;
  }
  return point;
}
