import type { listSignals } from '#shared/contracts/signals';
import type { OutOf } from '#shared/contracts/endpoint';
import { daysBetween } from '#shared/domain/calendar';
import type { AnswerPart } from '../../ui/answer/answer';
import { formatCount, formatCounted, formatDate, formatDays } from '../../ui/format';
import { KIND_NAMES, type SignalFilters } from './signal-filters';
import { canHurt } from './signal-words';

type SignalList = OutOf<typeof listSignals>;

/** What stands open, and when was looked. */
export interface SignalsSentences {
  readonly sentence: readonly AnswerPart[];
  readonly second: readonly AnswerPart[];
}

/** Says how many signals stand, where, and whether one of them can hurt somebody; `where` reads after "in". */
export function answerSignals(
  list: SignalList,
  { state, kind }: SignalFilters,
  where: string,
  today: string,
): SignalsSentences {
  const counted = state ? list.counts[state] : list.counts.open + list.counts.acknowledged;
  const second = [lookedWords(list.lookedOn, today)];
  const of = kind ? [{ quiet: ` (${KIND_NAMES[kind]})` }] : [];
  if (counted === 0) {
    if (list.lookedOn === null) {
      return { sentence: [`Nobody has looked for signals in ${where} yet.`], second };
    }
    return { sentence: [nothingWords(state, where), ...of], second };
  }
  const danger = list.items.filter((one) => canHurt(one) && one.state !== 'over').length;
  return {
    sentence: [
      { figure: formatCount(counted) },
      ` ${counted === 1 ? 'signal' : 'signals'} `,
      `${stands(state, counted, list.counts.acknowledged)} in ${where}`,
      ...of,
      ...dangerWords(danger, counted),
    ],
    second,
  };
}

/** When everything was last looked at: late is said, since a silent night is a signal that nobody sees. */
export function lookedWords(lookedOn: string | null, today: string): string {
  if (lookedOn === null) return 'The first look is made in the coming night.';
  const days = daysBetween(lookedOn, today);
  if (days <= 0) return `Looked at last night, ${formatDate(lookedOn)}.`;
  return `Last looked at on ${formatDate(lookedOn)}, ${formatDays(days)} ago: what came since has not been looked at.`;
}

function stands(state: SignalFilters['state'], counted: number, seen: number): string {
  const verb = counted === 1 ? 'is' : 'are';
  if (state === 'over') return `${verb} over`;
  if (state === 'acknowledged') return `${counted === 1 ? 'has' : 'have'} been seen`;
  if (state === 'open' || seen === 0) return `${verb} open`;
  if (seen === counted) return `${verb} not over, ${counted === 1 ? 'and is seen' : 'all seen'},`;
  return `${verb} not over, ${formatCounted(seen, 'of them seen', 'of them seen')},`;
}

function dangerWords(danger: number, counted: number): AnswerPart[] {
  if (danger === 0) return ['.'];
  if (counted === 1) return ['; it can hurt somebody.'];
  return [
    danger === 1 ? '; one can hurt somebody.' : `; ${formatCount(danger)} can hurt somebody.`,
  ];
}

function nothingWords(state: SignalFilters['state'], where: string): string {
  switch (state) {
    case 'open':
      return `No signal is open in ${where}.`;
    case 'acknowledged':
      return `No signal has been seen and is not over in ${where}.`;
    case 'over':
      return `No signal is over in ${where}.`;
    default:
      return `Nothing stands out in ${where}.`;
  }
}
