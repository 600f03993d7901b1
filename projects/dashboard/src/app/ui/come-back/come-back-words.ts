import type { ComeBack, ComeBackChange } from '#shared/contracts/come-back';
import { daysBetween } from '#shared/domain/calendar';
import { formatCounted, formatInstant, formatShortDate } from '../format';
import { COME_BACK_STATUS_NAMES, SIDE_NAMES, ZONE_NAMES } from '../words';

/** A finding left on a car as far as it can be marked. */
export type Markable = Pick<
  ComeBack,
  | 'branch'
  | 'jobRef'
  | 'ref'
  | 'seenAs'
  | 'workedAs'
  | 'structural'
  | 'status'
  | 'dueOn'
  | 'note'
  | 'ownerToldOn'
>;

/** What the caution beside a dangerous finding says. */
export const TELL_THE_OWNER =
  'A car with rot left in a load-bearing place may not be fit for the road: tell the owner in writing that it must be looked at and repaired before it is relied on. The local inspection rules decide.';

/** Tells one finding from every other. */
export function keyOfFinding({ branch, jobRef, ref }: Pick<Markable, 'branch' | 'jobRef' | 'ref'>) {
  return [branch, jobRef, ref].map(encodeURIComponent).join('/');
}

/** Where on the car: "sill, inner, left". */
export function placeOf({ zone, side }: Pick<ComeBack, 'zone' | 'side'>): string {
  return `${ZONE_NAMES[zone]}, ${SIDE_NAMES[side]}`;
}

/** Whether it still has to be dealt with. */
export function isStillOpen({ status }: Pick<ComeBack, 'status'>): boolean {
  return status !== 'done' && status !== 'gone';
}

/** Whole weeks since the car left with it. */
export function weeksSince(completedOn: string, today: string): number {
  return Math.max(0, Math.floor(daysBetween(completedOn, today) / 7));
}

/** How long it has been on the car: "31 weeks", "under a week". */
export function waitWords(completedOn: string, today: string): string {
  const weeks = weeksSince(completedOn, today);
  return weeks === 0 ? 'under a week' : formatCounted(weeks, 'week', 'weeks');
}

/** One mark in words, who and when last: "owner contacted, due 3 Mar 2026; Ilse Torven, 2 Feb 2026, 08:10". */
export function markWords(change: ComeBackChange): string {
  const said = [
    COME_BACK_STATUS_NAMES[change.status],
    ...(change.dueOn ? [`due ${formatShortDate(change.dueOn)}`] : []),
    ...(change.ownerToldOn
      ? [`owner told in writing on ${formatShortDate(change.ownerToldOn)}`]
      : []),
  ];
  return `${said.join(', ')}; ${change.changedBy}, ${formatInstant(change.changedAt)}`;
}
