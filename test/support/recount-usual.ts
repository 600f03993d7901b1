import { STAGES } from '#shared/domain/vocabulary';
import { quantile } from '#shared/stats/quantile';
import type { QuotedCar } from './quoted-cars';

interface Range {
  low: number | null;
  usual: number | null;
  high: number | null;
}

/** What a set of cars usually takes, counted afresh from the cars as sent. */
export function recountUsual(set: readonly QuotedCar[]): Record<string, unknown> {
  const codes = namesOf(set.flatMap(({ products }) => products.map(({ product }) => product)));
  const kinds = namesOf(set.flatMap(({ consumables }) => consumables.map(({ kind }) => kind)));
  return {
    stages: STAGES.map((stage) => ({
      stage,
      ...rangeOf(set.map(({ minutes }) => minutes[stage] ?? 0).filter((one) => one > 0)),
    })),
    total: rangeOf(set.map(({ minutes }) => sum(Object.values(minutes)))),
    products: codes.map((product) => ({
      product,
      ...rangeOf(
        taken(set, ({ products }) =>
          products.filter((line) => line.product === product).map(({ ml }) => ml),
        ),
      ),
    })),
    consumables: kinds.map((kind) => ({
      kind,
      ...rangeOf(
        taken(set, ({ consumables }) =>
          consumables.filter((line) => line.kind === kind).map(({ quantity }) => quantity),
        ),
      ),
    })),
  };
}

/** What each car that lists something took of it in all its lines. */
function taken(set: readonly QuotedCar[], linesOf: (car: QuotedCar) => number[]): number[] {
  return set.map(linesOf).flatMap((lines) => (lines.length > 0 ? [sum(lines)] : []));
}

function rangeOf(values: readonly number[]): Range {
  if (values.length < 5) return { low: null, usual: null, high: null };
  const sorted = Float64Array.from(values).sort();
  const at = (p: number): number => quantile(sorted, p) ?? NaN;
  return { low: at(0.025), usual: at(0.5), high: at(0.975) };
}

function namesOf(names: readonly string[]): string[] {
  return [...new Set(names)].sort();
}

function sum(values: readonly number[]): number {
  return values.reduce((all, one) => all + one, 0);
}
