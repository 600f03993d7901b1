/** Tables whose rows belong to a branch: readable through `ScopedDb` only. The tests compare this list with the live schema. */
export const SCOPED_TABLES = [
  'action_answers',
  'actions',
  'branch_rates',
  'branch_targets',
  'bookings',
  'claim_photos',
  'claims',
  'come_back_marks',
  'import_columns',
  'imports',
  'job_consumables',
  'job_extras',
  'job_facts',
  'job_findings',
  'job_products',
  'jobs',
  'jobs_under_way',
  'photos',
  'signals',
  'week_notes',
] as const;
export type ScopedTable = (typeof SCOPED_TABLES)[number];

/** Tables with a `branch_id` that are read by head office or by the sign-in only, never through a scope. */
export const UNSCOPED_BY_DESIGN = ['audit_events', 'person_branches', 'push_keys'] as const;

/** Tables without a `branch_id` whose rows hang on a scoped row; read only joined to it. */
export const HANGING_TABLES = ['job_revisions', 'claim_revisions'] as const;

/** Derived rows that a restatement may replace, visible in one generation only. */
export const GENERATION_TABLES: readonly ScopedTable[] = ['job_facts', 'job_products'];

/** `gen_to` of a row that no restatement has replaced. */
export const NO_END = 2_147_483_647;
