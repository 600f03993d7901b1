import type { Action, ActionEffect, WatchedSide } from '#shared/contracts/actions';
import { addDays, daysBetween } from '#shared/domain/calendar';
import type { BranchMeasure } from '#shared/domain/vocabulary';
import type { AnswerPart } from '../../ui/answer/answer';
import { formatCars, formatCounted, formatDate } from '../../ui/format';
import { amountOfChange, formatMeasureChange } from '../../ui/measure-words';

/** Fewest cars on either side for a figure (rule 13). */
const LEAST_CARS = 5;
const WEEKS = 26;

/** What the figure did since the action was agreed. */
export interface EffectSentences {
  readonly sentence: readonly AnswerPart[];
  readonly second: readonly AnswerPart[];
}

/** How a branch's measure is said with a verb: "overran", and what more and less of it are. */
const VERBS: Readonly<Record<BranchMeasure, { does: string; more: string; less: string }>> = {
  overrun: { does: 'overran', more: 'more', less: 'less' },
  rot: { does: 'found rot on', more: 'more of its cars', less: 'fewer of its cars' },
  claims: { does: 'had', more: 'more claims', less: 'fewer claims' },
  product: { does: 'used', more: 'more of the norm', less: 'less of the norm' },
  margin: { does: 'kept', more: 'more of what it billed', less: 'less of what it billed' },
};

/** Says the change with what it may be off by, or why it cannot be told yet and about when it can. */
export function tellEffect(
  { agreedOn, endedOn }: Pick<Action, 'agreedOn' | 'endedOn'>,
  effect: ActionEffect,
  branchName: string,
  today: string,
): EffectSentences {
  const { change, lower, upper, measure, before, after } = effect;
  if (change === null) {
    return {
      sentence: [`What it did to ${watched(measure)} cannot be told yet.`],
      second: [whyNot(effect, { agreedOn, endedOn }, today)],
    };
  }
  const { does, more, less } = VERBS[measure];
  const sure = lower !== null && upper !== null && (lower > 0 || upper < 0);
  const half = lower === null || upper === null ? undefined : (upper - lower) / 2;
  const way = change < 0 ? less : more;
  const [number, ...unit] = formatMeasureChange(measure, change).split(' ');
  return {
    sentence: [
      `Since ${formatDate(agreedOn)} ${branchName} ${does} `,
      { figure: number! },
      ` ${unit.join(' ')} ${way} than in the ${formatCounted(WEEKS, 'week', 'weeks')} before`,
      {
        quiet: ` (${half === undefined ? '' : `give or take ${amountOfChange(measure, half)}; `}${formatCars(before.cars)} before, ${formatCars(after.cars)} since)`,
      },
      ', allowing for the cars.',
    ],
    second: [
      sure
        ? 'That is more than chance explains; it does not say that the action alone did it.'
        : 'That is within what chance explains, so it may be no change at all.',
      ...(measure === 'claims' ? [LATE_CLAIMS] : []),
    ],
  };
}

const LATE_CLAIMS =
  ' Claims come months after the work, so most of what an action does to them shows later.';

function watched(measure: BranchMeasure): string {
  return measure === 'rot' ? 'the rot found' : measure === 'product' ? 'product use' : measure;
}

function whyNot(
  { before, after }: ActionEffect,
  { agreedOn, endedOn }: Pick<Action, 'agreedOn' | 'endedOn'>,
  today: string,
): string {
  if (before.cars < LEAST_CARS) {
    return `Only ${formatCars(before.cars)} that ${before.cars === 1 ? 'counts' : 'count'} stood in the 26 weeks before ${formatDate(agreedOn)}; it takes ${LEAST_CARS}, so there is nothing to compare with.`;
  }
  if (after.cars >= LEAST_CARS) {
    return 'The cars of both times are there, but they differ too little among themselves to say how far off the change may be.';
  }
  const counted = `${after.cars === 0 ? 'No car that counts has' : `Only ${formatCars(after.cars)} that ${after.cars === 1 ? 'counts has' : 'count have'}`} been finished since ${formatDate(agreedOn)}; it takes ${LEAST_CARS}.`;
  const on = expectedDay(before, after, today);
  return endedOn === null || on !== undefined
    ? `${counted}${on ? ` At the pace of before that is about ${formatDate(on)}.` : ''}`
    : counted;
}

/** The day on which enough cars will have been finished, at the pace of the time before. */
function expectedDay(before: WatchedSide, after: WatchedSide, today: string): string | undefined {
  const days = daysBetween(before.from, before.to) + 1;
  if (before.cars === 0 || days <= 0) return undefined;
  return addDays(today, Math.ceil(((LEAST_CARS - after.cars) * days) / before.cars));
}
