import {
  SIGNAL_KINDS,
  SIGNAL_STATES,
  type SignalKind,
  type SignalState,
} from '#shared/domain/vocabulary';

/** What the list is narrowed to; absent: what is not over, of every kind. */
export interface SignalFilters {
  readonly state: SignalState | undefined;
  readonly kind: SignalKind | undefined;
}

type FromUrl = string | readonly string[] | undefined;

/** Which states are on offer, in the order in which a signal goes through them. */
export const STATE_CHOICES: readonly { readonly value: string; readonly name: string }[] = [
  { value: '', name: 'not over' },
  { value: 'open', name: 'open' },
  { value: 'acknowledged', name: 'seen' },
  { value: 'over', name: 'over' },
];

/** What is looked for each night, as the list is narrowed by it. */
export const KIND_NAMES: Readonly<Record<SignalKind, string>> = {
  come_backs_due: 'dangerous come-backs past due',
  silence: 'no jobs arriving',
  odd_values: 'values that look wrong',
  unbilled: 'cars long unbilled',
  week_outside: 'a week outside its limits',
  run_of_eight: 'eight weeks on one side',
  left_funnel: 'outside the branches’ funnel',
  drift_overrun: 'overrun drifting',
  drift_claims: 'claims drifting',
};

/** Reads the filters from the URL; what makes no sense there is left out. */
export function filtersOf(state: FromUrl, kind: FromUrl): SignalFilters {
  return {
    state: SIGNAL_STATES.find((one) => wordsOf(state).includes(one)),
    kind: SIGNAL_KINDS.find((one) => wordsOf(kind).includes(one)),
  };
}

function wordsOf(value: FromUrl): readonly string[] {
  if (value === undefined) return [];
  return typeof value === 'string' ? [value] : value;
}
