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

/** Today in a scope: the latest local date among its branches, the UTC date when there is none (rule 9). */
export function todayIn(scope: Scope, clock: Clock): string {
  const now = clock.now();
  const zones = new Set(scope.branches.map((branch) => branch.timeZone));
  let latest = '';
  for (const zone of zones.size > 0 ? zones : ['UTC']) {
    const date = localDate(now, zone);
    if (date > latest) latest = date;
  }
  return latest;
}
