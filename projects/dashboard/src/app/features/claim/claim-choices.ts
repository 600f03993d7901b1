import {
  CLAIM_CAUSES,
  CLAIM_DECISIONS,
  type ClaimCause,
  type ClaimDecision,
} from '#shared/domain/vocabulary';
import { CLAIM_CAUSE_NAMES, CLAIM_DECISION_NAMES } from '../../ui/words';

/** One answer of several, with a sentence that says when it is the right one. */
export interface ExplainedAnswer {
  readonly value: string;
  readonly words: string;
  readonly explained: string;
}

const CAUSES: Readonly<Record<ClaimCause, string>> = {
  missed_area: 'Product never reached the place.',
  thin_coverage: 'Product is there, but too little of it to hold.',
  damage: 'A stone, a jack or other work broke the coat.',
  drain_blocked: 'Water stood in the void because it could not run off.',
  not_covered: 'The place or the cause is outside what the warranty promises.',
};

const DECISIONS: Readonly<Record<ClaimDecision, string>> = {
  open: 'Not decided yet.',
  accepted: 'Put right under the warranty.',
  goodwill: 'Put right without being owed.',
  refused: 'Not put right; no longer counted among the claims.',
};

/** What came of the car, as it can be chosen. */
export const CAUSE_ANSWERS: readonly ExplainedAnswer[] = CLAIM_CAUSES.map((value) => ({
  value,
  words: CLAIM_CAUSE_NAMES[value],
  explained: CAUSES[value],
}));

/** How a claim can be decided. */
export const DECISION_ANSWERS: readonly ExplainedAnswer[] = CLAIM_DECISIONS.map((value) => ({
  value,
  words: CLAIM_DECISION_NAMES[value],
  explained: DECISIONS[value],
}));
