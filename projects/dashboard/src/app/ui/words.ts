import type {
  Action,
  BodyType,
  Check,
  CheckAnswer,
  ClaimCause,
  ClaimDecision,
  ComeBackStatus,
  Condition,
  ConsumableKind,
  ProductKind,
  Role,
  Side,
  Source,
  Stage,
  Zone,
} from '#shared/domain/vocabulary';

/** The vocabulary's codes as people say them: lower case for trade words, plain English otherwise. */

export const ROLE_NAMES: Readonly<Record<Role, string>> = {
  recorder: 'recorder',
  site_manager: 'site manager',
  regional_lead: 'regional lead',
  head_office: 'head office',
};

export const STAGE_NAMES: Readonly<Record<Stage, string>> = {
  strip: 'strip',
  clean: 'clean',
  dry: 'dry',
  repair: 'repair',
  mask: 'mask',
  apply: 'apply',
  refit: 'refit',
};

export const ZONE_NAMES: Readonly<Record<Zone, string>> = {
  front_wing: 'front wing',
  front_arch: 'front arch',
  bulkhead_drain: 'bulkhead drain',
  sill_outer: 'sill, outer',
  sill_inner: 'sill, inner',
  floor: 'floor',
  jacking_point: 'jacking point',
  chassis_rail: 'chassis rail',
  front_subframe: 'front subframe',
  rear_arch: 'rear arch',
  rear_subframe: 'rear subframe',
  boot_floor: 'boot floor',
  door_bottom: 'door bottom',
  slam_panel: 'slam panel',
  tailgate: 'tailgate',
};

export const SIDE_NAMES: Readonly<Record<Side, string>> = {
  left: 'left',
  right: 'right',
  centre: 'centre',
};

export const CONDITION_NAMES: Readonly<Record<Condition, string>> = {
  surface: 'surface',
  bubbling: 'bubbling',
  holed: 'holed',
};

export const ACTION_NAMES: Readonly<Record<Action, string>> = {
  treated: 'treated',
  patched: 'patched',
  deferred: 'deferred',
  declined: 'declined by the owner',
};

export const COME_BACK_STATUS_NAMES: Readonly<Record<ComeBackStatus, string>> = {
  open: 'open',
  contacted: 'owner contacted',
  booked: 'booked in',
  done: 'done',
  gone: 'car is gone',
};

export const CLAIM_CAUSE_NAMES: Readonly<Record<ClaimCause, string>> = {
  missed_area: 'missed area',
  thin_coverage: 'too thin a coat',
  damage: 'damaged since',
  drain_blocked: 'drain hole blocked',
  not_covered: 'not covered',
};

export const CLAIM_DECISION_NAMES: Readonly<Record<ClaimDecision, string>> = {
  open: 'open',
  accepted: 'accepted',
  goodwill: 'goodwill',
  refused: 'refused',
};

export const BODY_TYPE_NAMES: Readonly<Record<BodyType, string>> = {
  hatchback: 'hatchback',
  saloon: 'saloon',
  estate: 'estate',
  suv: 'SUV',
  pickup: 'pick-up',
  van: 'van',
  camper: 'camper',
  classic: 'classic',
};

/** Several of a body type, as the scope line says it. */
export const BODY_TYPE_PLURALS: Readonly<Record<BodyType, string>> = {
  hatchback: 'hatchbacks',
  saloon: 'saloons',
  estate: 'estates',
  suv: 'SUVs',
  pickup: 'pick-ups',
  van: 'vans',
  camper: 'campers',
  classic: 'classics',
};

export const PRODUCT_KIND_NAMES: Readonly<Record<ProductKind, string>> = {
  cavity_wax: 'cavity wax',
  underbody_wax: 'underbody wax',
  stone_chip: 'stone-chip coat',
  rust_converter: 'rust converter',
  zinc_primer: 'zinc primer',
  seam_sealer: 'seam sealer',
};

export const CONSUMABLE_NAMES: Readonly<Record<ConsumableKind, string>> = {
  trim_clip: 'trim clips',
  blanking_plug: 'blanking plugs',
  masking_film: 'masking film',
  patch_steel: 'patch steel',
  other: 'other',
};

/** Each process check as the sentence that a yes confirms. */
export const CHECK_NAMES: Readonly<Record<Check, string>> = {
  linersOff: 'arch liners off before cleaning',
  bothDirections: 'each void sprayed from both ends',
  brakesCovered: 'brakes covered',
  driedOut: 'cavities dry before product',
  drainsClear: 'drain holes open afterwards',
  primerCured: 'primer cured',
};

export const CHECK_ANSWER_NAMES: Readonly<Record<CheckAnswer, string>> = {
  yes: 'yes',
  no: 'no',
  na: 'does not apply',
};

/** By which way a revision came in (rule 85), read after "from". */
export const SOURCE_NAMES: Readonly<Record<Source, string>> = {
  person: 'a person signed in',
  key: "the branch's system, by push key",
  file: 'an imported file',
  form: 'the form',
};
