import type { Action } from '#shared/contracts/actions';
import { ACTION_STATES, type ActionState } from '#shared/domain/vocabulary';
import { formatDate, formatShortDate } from '../../ui/format';

/** What the list is narrowed to. */
export const STATE_CHOICES: readonly { readonly value: string; readonly name: string }[] = [
  { value: '', name: 'all' },
  { value: 'agreed', name: 'under way' },
  { value: 'done', name: 'done' },
  { value: 'dropped', name: 'dropped' },
];

/** Where an action stands, in words. */
export const ACTION_STATE_NAMES: Readonly<Record<ActionState, string>> = {
  agreed: 'under way',
  done: 'done',
  dropped: 'dropped',
};

/** A known state from the URL or none. */
export function actionStateOf(
  value: string | readonly string[] | undefined,
): ActionState | undefined {
  const words = value === undefined ? [] : typeof value === 'string' ? [value] : value;
  return ACTION_STATES.find((state) => words.includes(state));
}

/** Where it stands, with its day: "under way", "late: due 3 Jan 2026", "done on 2 Feb 2026". */
export function standingWords({ state, late, endedOn, until }: Action): string {
  if (state === 'agreed') return late ? `late, was due ${formatShortDate(until)}` : 'under way';
  return endedOn
    ? `${ACTION_STATE_NAMES[state]} on ${formatShortDate(endedOn)}`
    : ACTION_STATE_NAMES[state];
}

/** Who agreed it and when: "agreed on 3 November 2025 by Runa Estvik". */
export function agreedWords({ agreedOn, agreedBy }: Action): string {
  return `agreed on ${formatDate(agreedOn)} by ${agreedBy}`;
}
