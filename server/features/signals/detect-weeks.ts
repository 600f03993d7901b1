import type { MarginAnswer, MarginWeek } from '#shared/contracts/margin';
import { addDays, mondayOfWeek } from '#shared/domain/calendar';
import type { FactsByKind, Side } from '#shared/domain/signal-facts';
import { plainSignal, type FoundSignal } from './found-signal';

/** Weeks of a run (rule 6). */
const RUN = 8;
/** A last billed week older than this is no news any more: such a branch is silent, unbilled or closed. */
const FRESH_DAYS = 35;

/** The judged weeks of a branch, as its page shows them. */
export interface JudgedBranch {
  branchId: number;
  today: string;
  weeks: readonly MarginWeek[];
  limits: MarginAnswer['limits'];
}

type Judged = MarginWeek & { marginShare: number };

/** The last whole billed week beyond its limits; there as long as it is the last (rules 4 to 7). */
export function detectWeekOutside(branch: JudgedBranch): FoundSignal[] {
  const { limits } = branch;
  const last = judgedOf(branch).at(-1);
  if (!last || !limits) return [];
  const { marginShare, week, jobs, unbilled } = last;
  if (last.signal !== 'outside_low' && last.signal !== 'outside_high') return [];
  const { centre, lower, upper } = limits;
  const side: Side = last.signal === 'outside_low' ? 'low' : 'high';
  const facts: FactsByKind['week_outside'] = { week, side, marginShare, centre, lower, upper };
  const reach = side === 'low' ? centre - lower : upper - centre;
  return [
    plainSignal({
      branchId: branch.branchId,
      kind: 'week_outside',
      key: week,
      since: mondayOfWeek(week),
      // Without any earlier movement every week is outside; how far is then told by the share alone.
      strength: reach > 0 ? Math.abs(marginShare - centre) / reach : 1,
      facts: { ...facts },
      cars: jobs - unbilled,
      listed: [],
    }),
  ];
}

/**
 * Eight or more billed weeks running, up to the last, on one side of the centre. Its key is the side: a centre that moves with
 * its baseline moves the first week of a run without making it another run.
 */
export function detectRunOfEight(branch: JudgedBranch): FoundSignal[] {
  const { limits } = branch;
  const judged = judgedOf(branch);
  const last = judged.at(-1);
  if (!last || !limits) return [];
  const sideOf = ({ marginShare }: Judged): number => Math.sign(marginShare - limits.centre);
  const direction = sideOf(last);
  let first = judged.length;
  while (first > 0 && sideOf(judged[first - 1] as Judged) === direction) first -= 1;
  const run = judged.slice(first);
  if (direction === 0 || run.length < RUN) return [];
  const side: Side = direction < 0 ? 'low' : 'high';
  const facts: FactsByKind['run_of_eight'] = {
    side,
    weeks: run.length,
    lastWeek: last.week,
    centre: limits.centre,
  };
  return [
    plainSignal({
      branchId: branch.branchId,
      kind: 'run_of_eight',
      key: side,
      since: mondayOfWeek((run[0] as Judged).week),
      strength: run.length,
      facts: { ...facts },
      cars: run.reduce((sum, { jobs, unbilled }) => sum + jobs - unbilled, 0),
      listed: [],
    }),
  ];
}

function judgedOf({ weeks, today }: JudgedBranch): Judged[] {
  const judged = weeks.filter((week): week is Judged => week.whole && week.marginShare !== null);
  const last = judged.at(-1);
  return last && mondayOfWeek(last.week) >= addDays(today, -FRESH_DAYS) ? judged : [];
}
