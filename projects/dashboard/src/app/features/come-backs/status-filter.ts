import { COME_BACK_STATUSES, type ComeBackStatus } from '#shared/domain/vocabulary';
import { COME_BACK_STATUS_NAMES } from '../../ui/words';

/** What the list is narrowed to; `undefined` is what is still to be dealt with. */
export type StatusChoice = ComeBackStatus | undefined;

/** The choices on offer, in the order in which a finding goes through them. */
export const STATUS_CHOICES: readonly { readonly value: string; readonly name: string }[] = [
  { value: '', name: 'still on cars' },
  ...COME_BACK_STATUSES.map((status) => ({
    value: status,
    name: COME_BACK_STATUS_NAMES[status],
  })),
];

/** A known status from the URL or none. */
export function statusOf(value: string | readonly string[] | undefined): StatusChoice {
  const words = value === undefined ? [] : typeof value === 'string' ? [value] : value;
  return COME_BACK_STATUSES.find((status) => words.includes(status));
}
