import type { FieldProblem } from '#shared/contracts/fields';
import { isDate } from '#shared/domain/calendar';

/** Rules of set-up that reach across fields or to other rows, over raw bodies: silent where the shape is wrong (rule 57). */

/** Every line of a norm names a product there is, and each product once. */
export function breaksOfNorm(raw: unknown, isProduct: (code: string) => boolean): FieldProblem[] {
  const lines = fieldOf(raw, 'norms');
  const seen = new Set<string>();
  return (Array.isArray(lines) ? lines : []).flatMap((line: unknown, index) => {
    const product = fieldOf(line, 'product');
    if (typeof product !== 'string') return [];
    const path = `/norms/${index}/product`;
    if (!isProduct(product)) return [{ path, message: 'no product has this code' }];
    if (seen.has(product)) return [{ path, message: 'this product is in the norm already' }];
    seen.add(product);
    return [];
  });
}

/** A branch lies in a region there is and does not close before it opens. */
export function breaksOfBranch(raw: unknown, isRegion: (code: string) => boolean): FieldProblem[] {
  const problems: FieldProblem[] = [];
  const region = fieldOf(raw, 'region');
  if (typeof region === 'string' && !isRegion(region)) {
    problems.push({ path: '/region', message: 'no region has this code; create it first' });
  }
  const opened = fieldOf(raw, 'openedOn');
  const closed = fieldOf(raw, 'closedOn');
  if (isDay(opened) && isDay(closed) && closed < opened) {
    problems.push({ path: '/closedOn', message: `is before openedOn (${opened})` });
  }
  return problems;
}

function fieldOf(raw: unknown, name: string): unknown {
  return typeof raw === 'object' && raw !== null
    ? (raw as Record<string, unknown>)[name]
    : undefined;
}

function isDay(value: unknown): value is string {
  return typeof value === 'string' && isDate(value);
}
