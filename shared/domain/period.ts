import { addDays, daysBetween, mondayOf } from './calendar';
import type { RuleBreak } from './job-rules';

/** Days from one to another, both included. */
export interface Period {
  from: string;
  to: string;
}

/** A century of weeks fits on no screen; more would only be a mistyped year, and an answer of millions of empty weeks. */
const LONGEST_YEARS = 100;

/** The 52 ISO weeks up to today: from the Monday 51 weeks before the Monday of today's week (rule 9). */
export function defaultPeriod(today: string): Period {
  return { from: addDays(mondayOf(today), -51 * 7), to: today };
}

/** The period asked for, its missing ends filled from the default. */
export function periodOf(
  asked: { from?: string | undefined; to?: string | undefined },
  today: string,
): Period {
  const usual = defaultPeriod(today);
  return { from: asked.from ?? usual.from, to: asked.to ?? usual.to };
}

/** What is wrong with a period: it ends before it begins. */
export function breaksOfPeriod({ from, to }: Period): RuleBreak[] {
  if (from <= to) return [];
  return [
    { path: '/query/from', message: `is after to (${to})` },
    { path: '/query/to', message: `is before from (${from})` },
  ];
}

/** What is wrong with a period that is answered week by week: that, or more weeks than anybody reads. */
export function breaksOfWeeks(period: Period): RuleBreak[] {
  if (daysBetween(period.from, period.to) <= LONGEST_YEARS * 366) return breaksOfPeriod(period);
  return [
    {
      path: '/query/from',
      message: `is more than ${LONGEST_YEARS} years before to (${period.to})`,
    },
  ];
}
