import { localDate } from '#shared/domain/calendar';
import type { Scope } from '#db/scope';

/** Where "now" comes from. Business dates use it; tokens, lockout and cookies use the real one (rule 63). */
export interface Clock {
  now(): Date;
}

/** The machine's clock. */
export const realClock: Clock = { now: () => new Date() };

/** A clock that stands still at an instant. */
export function fixedClock(instant: Date): Clock {
  return { now: () => new Date(instant) };
}

/** The day that every branch of a scope has reached: the earliest local date among them, the UTC date when there is none. */
export function dayReachedIn(scope: Scope, clock: Clock): string {
  return datesIn(scope, clock)[0] as string;
}

/** Today in a scope: the latest local date among its branches, the UTC date when there is none (rule 9). */
export function todayIn(scope: Scope, clock: Clock): string {
  return datesIn(scope, clock).at(-1) as string;
}

/** The local dates of the branches at this moment, sorted. */
function datesIn(scope: Scope, clock: Clock): string[] {
  const now = clock.now();
  const zones = new Set(scope.branches.map((branch) => branch.timeZone));
  return [...(zones.size > 0 ? zones : ['UTC'])].map((zone) => localDate(now, zone)).sort();
}
