import { compensatedSum } from '../stats/compensated-sum';
import { binomialLimits, poissonLimits, type FunnelLimits } from '../stats/funnel-limits';
import { FEWEST_CARS } from './small-samples';
import type { BranchMeasure, FunnelFlag } from './vocabulary';

/** Sums over the cars of one age band and package: what the measure divides (a) by what (e). */
export interface FunnelCell {
  /** Which cell. */
  key: number;
  cars: number;
  /** Σ e: estimated minutes, cars, thousands of car-years, norm ml, revenue. */
  e: number;
  /** Σ a by part (stages, age bands, causes, products, lines of cost); together Σ a. */
  parts: readonly number[];
  /** Σ a², Σ a·e and Σ e² over the cars: what the spread about a rate is made of. */
  aa: number;
  ae: number;
  ee: number;
}

/** What branches are compared with. */
export interface FunnelReference {
  measure: BranchMeasure;
  cars: number;
  /** Σ a / Σ e over everything; `undefined` where nothing divides. */
  value: number | undefined;
  /** Rates of a cell by part. */
  rates: ReadonlyMap<number, readonly number[]>;
  /** Residual variance of a − rate·e over the cars (rule 43); `undefined` with fewer than two. */
  variance: number | undefined;
  /** How many parts there are. */
  parts: number;
}

/** A branch in the funnel; what cannot be said is `undefined`. */
export interface FunnelPlace {
  cars: number;
  e: number;
  value: number | undefined;
  expected: number | undefined;
  /** The value and the expected value by part; empty where they are undefined. */
  parts: number[];
  expectedParts: number[];
  limits: FunnelLimits | undefined;
  flag: FunnelFlag;
}

/** Standard normal quantiles of 95 % and 99.8 % limits (rule 43). */
const Z = { at95: 1.959964, at998: 3.090232 };

/** Told below five cars too (rule 13): a margin share is money, a rate of claims has exact intervals. */
const ALWAYS_TOLD: readonly BranchMeasure[] = ['margin', 'claims'];

/** Rates by age band and package of everything that branches are compared with (rules 42 and 43). */
export function funnelReference(
  measure: BranchMeasure,
  cells: readonly FunnelCell[],
): FunnelReference {
  const byKey = new Map<number, FunnelCell[]>();
  for (const cell of cells) byKey.set(cell.key, [...(byKey.get(cell.key) ?? []), cell]);
  const parts = Math.max(0, ...cells.map((cell) => cell.parts.length));
  const rates = new Map<number, number[]>();
  const residuals: number[] = [];
  for (const [key, own] of byKey) {
    const e = total(own, (cell) => cell.e);
    const rate = sums(own, parts).map((a) => (e > 0 ? a / e : 0));
    rates.set(key, rate);
    residuals.push(squaresAbout(own, compensatedSum(rate)));
  }
  const cars = total(cells, (cell) => cell.cars);
  const e = total(cells, (cell) => cell.e);
  return {
    measure,
    cars,
    value: e > 0 ? compensatedSum(sums(cells, parts)) / e : undefined,
    rates,
    // Rounding can leave a spread of nothing a hair below it.
    variance: cars > 1 ? Math.max(0, compensatedSum(residuals)) / (cars - 1) : undefined,
    parts,
  };
}

/** Σ (a − r·e)² over the cars of some cells. */
export function squaresAbout(cells: readonly FunnelCell[], r: number): number {
  return total(cells, ({ aa, ae, ee }) => aa - 2 * r * ae + r * r * ee);
}

/** Where the cells of one branch put it in the funnel (rules 42 to 44). */
export function placeInFunnel(
  cells: readonly FunnelCell[],
  reference: FunnelReference,
): FunnelPlace {
  const { measure, parts } = reference;
  const cars = total(cells, (cell) => cell.cars);
  const e = total(cells, (cell) => cell.e);
  const enough = cars >= FEWEST_CARS;
  const told = e > 0 && (enough || ALWAYS_TOLD.includes(measure));
  const given = cells.map((cell) =>
    (reference.rates.get(cell.key) ?? []).map((rate) => rate * cell.e),
  );
  const counted = sums(cells, parts);
  const own = told ? counted.map((a) => a / e) : [];
  const expectedParts =
    e > 0 && enough
      ? own.map((_, part) => compensatedSum(given.map((one) => one[part] ?? 0)) / e)
      : [];
  // Of the sum, not of its parts' quotients: all cars of seven are 1, not a hair less.
  const value = told ? compensatedSum(counted) / e : undefined;
  const expected = e > 0 && enough ? compensatedSum(expectedParts) : undefined;
  const limits = expected === undefined ? undefined : limitsAbout(expected, { cars, e, reference });
  return {
    cars,
    e,
    value,
    expected,
    parts: own,
    expectedParts,
    limits,
    flag: flagOf(value, limits),
  };
}

/** A step from the reference's value to a branch's. */
export interface FunnelStep {
  key: string;
  value: number;
}

/**
 * What sets a branch apart from the reference: `mix` is what its own cars would bring at the reference's rates, each other step
 * what its part of the value is beyond that. The reference's value and all steps add up to the branch's value. `undefined` where
 * there is none to explain.
 */
export function stepsOf(
  { expected, parts, expectedParts }: FunnelPlace,
  reference: FunnelReference,
  keys: readonly string[],
): FunnelStep[] | undefined {
  if (expected === undefined || reference.value === undefined) return undefined;
  return [
    { key: 'mix', value: expected - reference.value },
    ...keys.map((key, part) => ({
      key,
      value: (parts[part] ?? 0) - (expectedParts[part] ?? 0),
    })),
  ];
}

function limitsAbout(
  expected: number,
  { cars, e, reference }: { cars: number; e: number; reference: FunnelReference },
): FunnelLimits | undefined {
  const { measure, variance } = reference;
  if (measure === 'rot') return binomialLimits(Math.min(1, Math.max(0, expected)), cars);
  if (measure === 'claims') return scaled(poissonLimits(expected * e), (count) => count / e);
  if (variance === undefined) return undefined;
  const error = (Math.sqrt(variance) * Math.sqrt(cars)) / e;
  return {
    lower95: expected - Z.at95 * error,
    upper95: expected + Z.at95 * error,
    lower998: expected - Z.at998 * error,
    upper998: expected + Z.at998 * error,
  };
}

function scaled(
  limits: FunnelLimits | undefined,
  scale: (limit: number) => number,
): FunnelLimits | undefined {
  return (
    limits && {
      lower95: scale(limits.lower95),
      upper95: scale(limits.upper95),
      lower998: scale(limits.lower998),
      upper998: scale(limits.upper998),
    }
  );
}

/** Rule 44: outside is strict, and the wider limits are told first. */
function flagOf(value: number | undefined, limits: FunnelLimits | undefined): FunnelFlag {
  if (value === undefined || !limits) return 'too_few';
  if (isBelow(value, limits.lower998)) return 'below_998';
  if (isBelow(limits.upper998, value)) return 'above_998';
  if (isBelow(value, limits.lower95)) return 'below_95';
  if (isBelow(limits.upper95, value)) return 'above_95';
  return 'as_expected';
}

/** Below by more than rounding: where cars differ in nothing, limits and value are the same figure summed in two ways. */
function isBelow(one: number, other: number): boolean {
  return other - one > 1e-12 * Math.max(Math.abs(one), Math.abs(other));
}

function sums(cells: readonly FunnelCell[], parts: number): number[] {
  return Array.from({ length: parts }, (_, part) => total(cells, (cell) => cell.parts[part] ?? 0));
}

function total(cells: readonly FunnelCell[], of: (cell: FunnelCell) => number): number {
  return compensatedSum(cells.map(of));
}
