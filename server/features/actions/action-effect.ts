import { readFunnelCells, scopedFunnelSource, type FunnelAsked } from '#db/queries/branches';
import type { NetworkReference } from '#db/network-reference';
import type { ScopedDb } from '#db/scoped-db';
import type { ActionEffect, WatchedSide } from '#shared/contracts/actions';
import { addDays } from '#shared/domain/calendar';
import {
  funnelReference,
  placeInFunnel,
  squaresAbout,
  type FunnelCell,
  type FunnelPlace,
  type FunnelReference,
} from '#shared/domain/funnel';
import type { Period } from '#shared/domain/period';
import { FEWEST_CARS } from '#shared/domain/small-samples';
import type { BranchMeasure } from '#shared/domain/vocabulary';
import { differenceInterval, type Estimate } from '#shared/stats/difference-interval';
import { Z_95 } from '#shared/stats/normal-distribution';
import { poissonInterval } from '#shared/stats/poisson-interval';
import { wilsonInterval } from '#shared/stats/wilson-interval';

/** Which measure of the scope's branch to watch, and since when. */
export interface EffectAsked {
  measure: BranchMeasure;
  agreedOn: string;
  today: string;
}

/** What a side lasts, half a year at most. */
const SIDE_DAYS = 26 * 7;

/** A side of an action with all that its cars are compared by. */
interface Side {
  period: Period;
  cells: readonly FunnelCell[];
  place: FunnelPlace;
  reference: FunnelReference;
}

/**
 * A measure of one branch before and after an action. Both sides are compared with one set of rates, those of the reference over
 * both of them, so that other cars than before are no effect. The interval is of the difference of the two sides' distances from
 * what their cars lead one to expect. One snapshot of the database.
 */
export function actionEffect(
  db: ScopedDb,
  { measure, agreedOn, today }: EffectAsked,
  network: NetworkReference,
): ActionEffect {
  return db.snapshot(() => {
    const [before, after] = [
      { from: addDays(agreedOn, -SIDE_DAYS), to: addDays(agreedOn, -1) },
      { from: agreedOn, to: least(today, addDays(agreedOn, SIDE_DAYS - 1)) },
    ];
    const { kind, cells } = network.funnelCells(
      askedOf(measure, { from: before.from, to: after.to }, today),
    );
    const reference = funnelReference(measure, cells);
    const sideOf = (period: Period): Side => {
      const own = readFunnelCells(scopedFunnelSource(db), askedOf(measure, period, today));
      return { period, cells: own, place: placeInFunnel(own, reference), reference };
    };
    const [was, is] = [sideOf(before), sideOf(after)];
    const [distanceBefore, distanceAfter] = [distanceOf(was), distanceOf(is)];
    const change =
      distanceBefore && distanceAfter && differenceInterval(distanceAfter, distanceBefore);
    return {
      measure,
      reference: kind,
      before: tellSide(was),
      after: tellSide(is),
      change: change?.value ?? null,
      lower: change?.lower ?? null,
      upper: change?.upper ?? null,
    };
  });
}

/** Cars finished in a period; of claims, cover and claims in it, whenever the car was finished. */
function askedOf(measure: BranchMeasure, period: Period, today: string): FunnelAsked {
  return measure === 'claims'
    ? { measure, filters: {}, today, within: period }
    : { measure, filters: period, today };
}

/** Below five cars neither value nor interval is told, of no measure: a before and after of four cars says nothing (rule 13). */
function tellSide(side: Side): WatchedSide {
  const { period, place } = side;
  const value = place.cars < FEWEST_CARS ? undefined : valueOf(side);
  return {
    ...period,
    cars: place.cars,
    value: value?.value ?? null,
    lower: value?.lower ?? null,
    upper: value?.upper ?? null,
    expected: place.expected ?? null,
  };
}

/** The value of a side with its 95 % interval: Wilson of a share, Garwood of a rate, the ratio estimator's of a ratio (rule 26). */
function valueOf(side: Side): Estimate | undefined {
  const { cells, place, reference } = side;
  const { value, cars, e } = place;
  if (value === undefined) return undefined;
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
  const { expected, value, cars } = place;
  const told = valueOf(side);
  if (cars < FEWEST_CARS || !told || expected === undefined || value === undefined) {
    return undefined;
  }
  const distance = value - expected;
  if (reference.measure === 'rot' || reference.measure === 'claims') {
    return { value: distance, lower: told.lower - expected, upper: told.upper - expected };
  }
  // What is left of a car's figure when its cell's rate and the branch's own distance are taken off.
  const squares = cells.map((cell) => {
    const rate = (reference.rates.get(cell.key) ?? []).reduce((sum, part) => sum + part, 0);
    return squaresAbout([cell], rate + distance);
  });
  return about(
    distance,
    squares.reduce((sum, one) => sum + one, 0),
    place,
  );
}

function about(value: number, squares: number, { cars, e }: FunnelPlace): Estimate {
  const error = Math.sqrt(Math.max(0, squares) / (cars * (cars - 1))) / (e / cars);
  return { value, lower: value - Z_95 * error, upper: value + Z_95 * error };
}

function least(one: string, other: string): string {
  return one < other ? one : other;
}
