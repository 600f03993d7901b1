import { compensatedSum } from '../stats/compensated-sum';
import { differenceInterval, type Estimate } from '../stats/difference-interval';
import { Z_95 } from '../stats/normal-distribution';
import { poissonInterval } from '../stats/poisson-interval';
import { wilsonInterval } from '../stats/wilson-interval';
import {
  placeInFunnel,
  squaresAbout,
  type FunnelCell,
  type FunnelPlace,
  type FunnelReference,
} from './funnel';
import { FEWEST_CARS } from './small-samples';

/** A measure in some weeks; `undefined` where too few cars say it. */
export interface WatchedFigures {
  cars: number;
  /** As counted, with its 95 % interval. */
  value: Estimate | undefined;
  /** What the reference's rates give for the same cars. */
  expected: number | undefined;
}

/** A measure before and after, and how its distance from what the cars lead one to expect has changed. */
export interface WatchedEffect {
  before: WatchedFigures;
  after: WatchedFigures;
  change: Estimate | undefined;
}

interface Side {
  cells: readonly FunnelCell[];
  place: FunnelPlace;
  reference: FunnelReference;
}

/**
 * A measure of one branch before and after, both compared with one set of rates, so that other cars than before are no effect.
 * The interval is of the difference of the two sides' distances (value − expected); the reference's own error is left out, as it
 * is of the funnel (rules 42 and 43). Nothing is told of fewer than five cars, of no measure (rule 13).
 */
export function watchedEffect(
  reference: FunnelReference,
  before: readonly FunnelCell[],
  after: readonly FunnelCell[],
): WatchedEffect {
  const sideOf = (cells: readonly FunnelCell[]): Side => ({
    cells,
    place: placeInFunnel(cells, reference),
    reference,
  });
  const [was, is] = [sideOf(before), sideOf(after)];
  const [distanceBefore, distanceAfter] = [distanceOf(was), distanceOf(is)];
  return {
    before: figuresOf(was),
    after: figuresOf(is),
    change: distanceBefore && distanceAfter && differenceInterval(distanceAfter, distanceBefore),
  };
}

function figuresOf(side: Side): WatchedFigures {
  const { cars, expected } = side.place;
  return { cars, value: valueOf(side), expected };
}

/** The value with its 95 % interval: Wilson of a share, Garwood of a rate, the ratio estimator's of a ratio (rule 26). */
function valueOf({ cells, place, reference }: Side): Estimate | undefined {
  const { value, cars, e } = place;
  if (value === undefined || cars < FEWEST_CARS) return undefined;
  if (reference.measure === 'rot') {
    const interval = wilsonInterval(Math.round(value * cars), cars);
    return interval && { value, lower: interval.lower, upper: interval.upper };
  }
  if (reference.measure === 'claims') {
    const { lower, upper } = poissonInterval(Math.round(value * e));
    return { value, lower: lower / e, upper: upper / e };
  }
  return about(value, squaresAbout(cells, value), place);
}

/** How far a side lies from what its cars lead one to expect. */
function distanceOf(side: Side): Estimate | undefined {
  const { cells, place, reference } = side;
  const { expected } = place;
  const told = valueOf(side);
  if (!told || expected === undefined) return undefined;
  const distance = told.value - expected;
  if (reference.measure === 'rot' || reference.measure === 'claims') {
    return { value: distance, lower: told.lower - expected, upper: told.upper - expected };
  }
  // What is left of a car's figure when its cell's rate and the branch's own distance are taken off.
  const squares = cells.map((cell) =>
    squaresAbout([cell], compensatedSum(reference.rates.get(cell.key) ?? []) + distance),
  );
  return about(distance, compensatedSum(squares), place);
}

function about(value: number, squares: number, { cars, e }: FunnelPlace): Estimate {
  // Rounding can leave a spread of nothing a hair below it.
  const error = Math.sqrt(Math.max(0, squares) / (cars * (cars - 1))) / (e / cars);
  return { value, lower: value - Z_95 * error, upper: value + Z_95 * error };
}
