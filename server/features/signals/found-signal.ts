import type { SignalFacts } from '#shared/domain/signal-facts';
import type { BranchMeasure, SignalKind } from '#shared/domain/vocabulary';

/** A car behind a signal, as it is kept: by its reference, with what is wrong with it where that differs from car to car. */
export interface CarBehind {
  ref: string;
  why: string;
}

/** What a look found at a branch. */
export interface FoundSignal {
  branchId: number;
  kind: SignalKind;
  /** Two of a kind at a branch are the same as long as their keys are. */
  key: string;
  measure: BranchMeasure | null;
  since: string;
  strength: number;
  facts: SignalFacts;
  cars: number;
  listed: CarBehind[];
  /** Branches behind the network figure that it compares with; null when a branch is compared with itself. */
  behind: number[] | null;
  /** `open` begins one; `keep` only keeps one from ending that is there: what hovers at a limit would come and go else. */
  weight: 'open' | 'keep';
}

/** Cars listed with a signal, at most: more nobody reads one by one. */
export const MOST_LISTED = 200;

/** What most kinds have in common. */
export function plainSignal(
  found: Pick<
    FoundSignal,
    'branchId' | 'kind' | 'key' | 'since' | 'strength' | 'facts' | 'cars' | 'listed'
  >,
): FoundSignal {
  return {
    ...found,
    measure: null,
    listed: found.listed.slice(0, MOST_LISTED),
    behind: null,
    weight: 'open',
  };
}
