import { readFunnelCells, scopedFunnelSource, type FunnelAsked } from '#db/queries/branches';
import type { NetworkReference } from '#db/network-reference';
import type { ScopedDb } from '#db/scoped-db';
import type { ActionEffect, WatchedSide } from '#shared/contracts/actions';
import { addDays } from '#shared/domain/calendar';
import { funnelReference, type FunnelCell } from '#shared/domain/funnel';
import type { Period } from '#shared/domain/period';
import type { BranchMeasure } from '#shared/domain/vocabulary';
import { watchedEffect, type WatchedFigures } from '#shared/domain/watched-effect';

/** Which measure of the scope's branch to watch, and since when. */
export interface EffectAsked {
  measure: BranchMeasure;
  agreedOn: string;
  today: string;
}

/** What a side lasts, half a year at most. */
const SIDE_DAYS = 26 * 7;

/**
 * A measure of one branch before and after an action, compared with the rates of the reference over both sides together. One
 * snapshot of the database.
 */
export function actionEffect(
  db: ScopedDb,
  { measure, agreedOn, today }: EffectAsked,
  network: NetworkReference,
): ActionEffect {
  const before = { from: addDays(agreedOn, -SIDE_DAYS), to: addDays(agreedOn, -1) };
  const after = { from: agreedOn, to: least(today, addDays(agreedOn, SIDE_DAYS - 1)) };
  const both = { from: before.from, to: after.to };
  return db.snapshot(() => {
    const { kind, cells } = network.funnelCells(askedOf(measure, both, today));
    const own = (period: Period): FunnelCell[] =>
      readFunnelCells(scopedFunnelSource(db), askedOf(measure, period, today));
    const effect = watchedEffect(funnelReference(measure, cells), own(before), own(after));
    return {
      measure,
      reference: kind,
      before: tellSide(before, effect.before),
      after: tellSide(after, effect.after),
      change: effect.change?.value ?? null,
      lower: effect.change?.lower ?? null,
      upper: effect.change?.upper ?? null,
    };
  });
}

/** Cars finished in a period; of claims, cover run and claims made in it, whenever the car was finished. */
function askedOf(measure: BranchMeasure, period: Period, today: string): FunnelAsked {
  return measure === 'claims'
    ? { measure, filters: {}, today, within: period }
    : { measure, filters: period, today };
}

function tellSide(period: Period, { cars, value, expected }: WatchedFigures): WatchedSide {
  return {
    ...period,
    cars,
    value: value?.value ?? null,
    lower: value?.lower ?? null,
    upper: value?.upper ?? null,
    expected: expected ?? null,
  };
}

function least(one: string, other: string): string {
  return one < other ? one : other;
}
