import type { Check, ClaimCause } from '#shared/domain/vocabulary';

/** Each process check as the sentence that a yes confirms. */
export const CHECK_WORDS: Readonly<Record<Check, string>> = {
  linersOff: 'arch liners off before cleaning',
  bothDirections: 'each void sprayed from both ends',
  brakesCovered: 'brakes covered',
  driedOut: 'cavities dry before product',
  drainsClear: 'drain holes open afterwards',
  primerCured: 'primer cured',
};

/** Each cause of a claim. */
export const CAUSE_WORDS: Readonly<Record<ClaimCause, string>> = {
  missed_area: 'missed area',
  thin_coverage: 'thin coverage',
  damage: 'damage from outside',
  drain_blocked: 'blocked drain',
  not_covered: 'not covered by the warranty',
};
