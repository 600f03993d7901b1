import type { Action, ActionEffect, listActions } from '#shared/contracts/actions';
import type { OutOf } from '#shared/contracts/endpoint';

type ActionList = OutOf<typeof listActions>;

/** An action under way at Havnsund since 3 November 2025, unless said. */
export function actionOf(id: number, more: Partial<Action> = {}): Action {
  return {
    branch: 'HAV',
    id,
    what: 'New clips before refit, and a second pair of hands for it.',
    who: 'Ilse Torven',
    until: '2026-02-27',
    measure: 'overrun',
    state: 'agreed',
    agreedOn: '2025-11-03',
    agreedBy: 'Aksel Brand',
    endedOn: null,
    late: false,
    signal: null,
    answers: [],
    ...more,
  };
}

/** Overrun six points lower than in the 26 weeks before, give or take four, unless said. */
export function effectOf(more: Partial<ActionEffect> = {}): ActionEffect {
  return {
    measure: 'overrun',
    reference: 'network',
    before: {
      from: '2025-05-05',
      to: '2025-11-02',
      cars: 240,
      value: 1.24,
      lower: 1.21,
      upper: 1.27,
      expected: 1.18,
    },
    after: {
      from: '2025-11-03',
      to: '2026-02-02',
      cars: 118,
      value: 1.17,
      lower: 1.13,
      upper: 1.21,
      expected: 1.17,
    },
    change: -0.06,
    lower: -0.1,
    upper: -0.02,
    ...more,
  };
}

/** A list of actions as the API answers it. */
export function actionList(items: readonly Action[], more: Partial<ActionList> = {}): ActionList {
  const count = (state: Action['state']): number =>
    items.filter((one) => one.state === state).length;
  return {
    items: [...items],
    nextCursor: null,
    counts: {
      agreed: count('agreed'),
      late: items.filter(({ late }) => late).length,
      done: count('done'),
      dropped: count('dropped'),
    },
    ...more,
  };
}
