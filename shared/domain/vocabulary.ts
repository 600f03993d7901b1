/** The trade's words, in the order in which the work happens or the eye reads. One list, used by contracts, tables and screens. */

/** Stages of labour in working order. */
export const STAGES = ['strip', 'clean', 'dry', 'repair', 'mask', 'apply', 'refit'] as const;
export type Stage = (typeof STAGES)[number];

/** Zones of a car seen from below. */
export const ZONES = [
  'front_wing',
  'front_arch',
  'bulkhead_drain',
  'sill_outer',
  'sill_inner',
  'floor',
  'jacking_point',
  'chassis_rail',
  'front_subframe',
  'rear_arch',
  'rear_subframe',
  'boot_floor',
  'door_bottom',
  'slam_panel',
  'tailgate',
] as const;
export type Zone = (typeof ZONES)[number];

export const SIDES = ['left', 'right', 'centre'] as const;
export type Side = (typeof SIDES)[number];

/** Conditions of rust from least to most grave; the order is their gravity. */
export const CONDITIONS = ['surface', 'bubbling', 'holed'] as const;
export type Condition = (typeof CONDITIONS)[number];

export const ACTIONS = ['treated', 'patched', 'deferred', 'declined'] as const;
export type Action = (typeof ACTIONS)[number];

export const BODY_TYPES = [
  'hatchback',
  'saloon',
  'estate',
  'suv',
  'pickup',
  'van',
  'camper',
  'classic',
] as const;
export type BodyType = (typeof BODY_TYPES)[number];

export const PRODUCT_KINDS = [
  'cavity_wax',
  'underbody_wax',
  'stone_chip',
  'rust_converter',
  'zinc_primer',
  'seam_sealer',
] as const;
export type ProductKind = (typeof PRODUCT_KINDS)[number];

export const CONSUMABLE_KINDS = [
  'trim_clip',
  'blanking_plug',
  'masking_film',
  'patch_steel',
  'other',
] as const;
export type ConsumableKind = (typeof CONSUMABLE_KINDS)[number];

/** Process checks of a job, in the order they are made. */
export const CHECKS = [
  'linersOff',
  'bothDirections',
  'brakesCovered',
  'driedOut',
  'drainsClear',
  'primerCured',
] as const;
export type Check = (typeof CHECKS)[number];

export const CHECK_ANSWERS = ['yes', 'no', 'na'] as const;
export type CheckAnswer = (typeof CHECK_ANSWERS)[number];

export const CLAIM_CAUSES = [
  'missed_area',
  'thin_coverage',
  'damage',
  'drain_blocked',
  'not_covered',
] as const;
export type ClaimCause = (typeof CLAIM_CAUSES)[number];

export const CLAIM_DECISIONS = ['open', 'accepted', 'goodwill', 'refused'] as const;
export type ClaimDecision = (typeof CLAIM_DECISIONS)[number];

export const ROLES = ['recorder', 'site_manager', 'regional_lead', 'head_office'] as const;
export type Role = (typeof ROLES)[number];

/** Where a revision of a job came from (rule 85). */
export const SOURCES = ['person', 'key', 'file', 'form'] as const;
export type Source = (typeof SOURCES)[number];

/** Age bands at completion, in whole years since first registration. */
export const AGE_BANDS = ['0-4', '5-9', '10-14', '15-19', '20+'] as const;
export type AgeBand = (typeof AGE_BANDS)[number];

/** Where a finding left on a car stands (rule 61); the first three are still to be dealt with. */
export const COME_BACK_STATUSES = ['open', 'contacted', 'booked', 'done', 'gone'] as const;
export type ComeBackStatus = (typeof COME_BACK_STATUSES)[number];
export const OPEN_COME_BACKS = ['open', 'contacted', 'booked'] as const satisfies ComeBackStatus[];

/** What branches are compared by (rules 42 and 43). */
export const BRANCH_MEASURES = ['overrun', 'rot', 'claims', 'product', 'margin'] as const;
export type BranchMeasure = (typeof BRANCH_MEASURES)[number];

/** Where a branch stands in its funnel; outside is strict (rule 44). */
export const FUNNEL_FLAGS = [
  'as_expected',
  'below_95',
  'above_95',
  'below_998',
  'above_998',
  'too_few',
] as const;
export type FunnelFlag = (typeof FUNNEL_FLAGS)[number];

/** What the nightly look finds, in the order in which it is told: what can hurt somebody first. */
export const SIGNAL_KINDS = [
  'come_backs_due',
  'silence',
  'odd_values',
  'unbilled',
  'week_outside',
  'run_of_eight',
  'left_funnel',
  'drift_overrun',
  'drift_claims',
] as const;
export type SignalKind = (typeof SIGNAL_KINDS)[number];

/** A signal is acknowledged by a person with a note; it is over by itself, when what it tells of is. */
export const SIGNAL_STATES = ['open', 'acknowledged', 'over'] as const;
export type SignalState = (typeof SIGNAL_STATES)[number];

/** Where an action agreed with a branch stands. */
export const ACTION_STATES = ['agreed', 'done', 'dropped'] as const;
export type ActionState = (typeof ACTION_STATES)[number];
