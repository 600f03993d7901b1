import type { CheckCase, Figure, Tolerance } from './check-values';

/**
 * Expects every figure of a case, within its tolerance, and every published value, to its last printed digit. A figure that
 * was not computed fails: no figure of a case goes unchecked.
 */
export function expectFigures(
  check: CheckCase<unknown>,
  computed: Record<string, Figure | undefined>,
): void {
  for (const [name, expected] of Object.entries(check.expected)) {
    const reach = toleranceOf(name, check.tolerance);
    expectNear(name, computed[name], expected, () => reach);
  }
  for (const [name, published] of Object.entries(check.published ?? {})) {
    expectNear(`published ${name}`, computed[name], published, lastDigit);
  }
}

type Value = number | string | null;

interface Reach {
  absolute?: number | undefined;
  relative?: number | undefined;
}

function expectNear(
  name: string,
  actual: Figure | null | undefined,
  expected: Figure | null,
  reachOf: (expected: Value) => Reach,
): void {
  if (expected === null || typeof expected === 'string' || typeof expected === 'number') {
    const near = isNear(actual, expected, reachOf(expected));
    expect({ name, actual: near ? expected : actual }).toEqual({ name, actual: expected });
    return;
  }
  const list = Array.isArray(actual) ? (actual as Value[]) : [];
  expect({ name, length: list.length }).toEqual({ name, length: expected.length });
  expected.forEach((value, index) => expectNear(`${name}[${index}]`, list[index], value, reachOf));
}

function isNear(actual: Figure | null | undefined, expected: Value, reach: Reach): boolean {
  if (typeof actual !== 'number' || typeof expected !== 'number') return actual === expected;
  const distance = Math.abs(actual - expected);
  return (
    distance <= (reach.absolute ?? 0) || distance <= (reach.relative ?? 0) * Math.abs(expected)
  );
}

function toleranceOf(name: string, tolerance: Tolerance): Reach {
  return {
    absolute: tolerance[`${name}_absolute`] ?? tolerance['absolute'],
    relative: tolerance[`${name}_relative`] ?? tolerance['relative'],
  };
}

/** Half a unit of the last printed digit, and a breath for the double's own rounding. */
function lastDigit(published: Value): Reach {
  if (typeof published !== 'number') return {};
  const decimals = String(published).split('.')[1]?.length ?? 0;
  return { absolute: 0.5 * 10 ** -decimals * (1 + 1e-9) };
}
