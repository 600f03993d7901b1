import type { Knex } from 'knex';
import { folded } from '#shared/domain/recorded-job';
import type { BodyType, ClaimCause, ClaimDecision, Side, Zone } from '#shared/domain/vocabulary';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import { whereJobs, type JobFilters } from './job-filters';

export type ClaimSort = 'made' | 'cost' | 'completed';

/** Filters of the list of claims; those of a job choose claims by the job they are made on. */
export interface ClaimFilters extends JobFilters {
  /** Only claims that count at the day of the list, or only those that do not. */
  counted?: boolean | undefined;
  decision?: ClaimDecision | undefined;
  /** Claims whose decision waits for head office, or those where none does. */
  waiting?: boolean | undefined;
  cause?: ClaimCause | undefined;
  zone?: Zone | undefined;
  ageBandIndex?: number | undefined;
  /** First and last day of the half-year of completion. */
  cohort?: { from: string; to: string } | undefined;
  jobRef?: string | undefined;
  /** Plain text, looked for in both references, make and model without regard to case. */
  text?: string | undefined;
}

/** Where a page of the list ended: the values its last row was sorted by. */
export interface ClaimPlace {
  key: number;
  completedOn: string;
  branch: string;
  jobRef: string;
  claimRef: string;
}

/** A row as stored, before it is told. */
export interface ListedClaim {
  sortKey: number;
  branch: string;
  claim_ref: string;
  revision: number;
  job_ref: string;
  make: string;
  model: string;
  body_type: BodyType;
  first_registered: string;
  package: string;
  completed_on: string;
  warranty_months: number;
  made_on: string;
  counted: number;
  zone: Zone;
  side: Side | null;
  cause: ClaimCause;
  decision: ClaimDecision;
  proposed_decision: ClaimDecision | null;
  decided_on: string | null;
  paid_on: string | null;
  labour_minutes: number;
  product_ml: number;
  cost_cents: number;
}

/** How many claims match, and what they cost. */
export interface ClaimTotals {
  claims: number;
  costCents: number;
}

/** Each sort as one value that rises. */
const SORT_KEYS: Record<ClaimSort, string> = {
  made: `-cast(replace(made_on, '-', '') as integer)`,
  cost: '-cost_cents',
  completed: '0',
};

/**
 * Whether a claim counts at a day, bound twice: what `claimStanding` says, for a filter (rules 14 and 16). Made by that day and by
 * the end of a warranty, whose day is the month's last where the month is too short, and not refused by that day. That its job
 * counts goes without saying: only jobs that do have a flat row.
 */
const COUNTED = `(made_on <= ?
  and job_facts.warranty_months > 0 and made_on <= date(job_facts.completed_on, '+' || job_facts.warranty_months || ' months', 'floor')
  and (decision <> 'refused' or coalesce(decided_on > ?, false)))`;

const OF_CLAIM = [
  ...['claim_ref', 'revision', 'made_on', 'zone', 'side', 'cause', 'decision'],
  ...['proposed_decision', 'decided_on', 'paid_on', 'labour_minutes', 'product_ml', 'cost_cents'],
];
const OF_JOB = [
  ...['job_ref', 'make', 'model', 'body_type', 'first_registered', 'completed_on'],
  'warranty_months',
];

/** Claims in scope that match, sorted, from a place on. Ties go by newest completion, branch and references (rule 67). */
export function listClaimRows(
  db: ScopedDb,
  filters: ClaimFilters,
  asOf: string,
  sort: ClaimSort,
  after: ClaimPlace | undefined,
  limit: number,
): ListedClaim[] {
  const query = sortedClaims(db, filters, asOf, sort).limit(limit);
  if (after) {
    const key = SORT_KEYS[sort];
    query.whereRaw(
      `(${key} > ? or (${key} = ? and (completed_on < ? or (completed_on = ?
        and (branches.code, job_ref, claim_ref) > (?, ?, ?)))))`,
      [
        ...[after.key, after.key, after.completedOn, after.completedOn],
        ...[after.branch, after.jobRef, after.claimRef],
      ],
    );
  }
  return db.all<ListedClaim>(query);
}

/** All of them, one at a time and in the same order, for an export. */
export function iterateClaimRows(
  db: ScopedDb,
  filters: ClaimFilters,
  asOf: string,
  sort: ClaimSort,
): IterableIterator<ListedClaim> {
  return db.iterate<ListedClaim>(sortedClaims(db, filters, asOf, sort));
}

/** How many match, and their cost. */
export function sumClaims(db: ScopedDb, filters: ClaimFilters, asOf: string): ClaimTotals {
  const row = db.first<ClaimTotals>(
    matchingClaims(db, filters, asOf).select({
      claims: sql.raw('count(*)'),
      costCents: sql.raw('coalesce(sum(cost_cents), 0)'),
    }),
  );
  return row ?? { claims: 0, costCents: 0 };
}

function sortedClaims(
  db: ScopedDb,
  filters: ClaimFilters,
  asOf: string,
  sort: ClaimSort,
): Knex.QueryBuilder {
  return (
    matchingClaims(db, filters, asOf)
      .join('branches', 'branches.id', 'claims.branch_id')
      .join('packages', 'packages.id', 'job_facts.package_id')
      // By its alias: a constant key written out would be read as the number of a column.
      .orderByRaw('"sortKey", completed_on desc, branches.code, job_ref, claim_ref')
      .select(
        ...OF_CLAIM.map((column) => `claims.${column}`),
        ...OF_JOB.map((column) => `job_facts.${column}`),
        { branch: 'branches.code', package: 'packages.code' },
        sql.raw(`${COUNTED} as counted`, [asOf, asOf]),
        sql.raw(`${SORT_KEYS[sort]} as "sortKey"`),
      )
  );
}

/** A voided job has no flat row, so that its claims are absent (rule 59). */
function matchingClaims(db: ScopedDb, filters: ClaimFilters, asOf: string): Knex.QueryBuilder {
  const query = whereJobs(
    db.table('claims').join(db.derived('job_facts'), 'job_facts.job_id', 'claims.job_id'),
    filters,
  );
  if (filters.counted !== undefined) {
    query.whereRaw(`${COUNTED} = ?`, [asOf, asOf, filters.counted ? 1 : 0]);
  }
  if (filters.decision !== undefined) query.where('decision', filters.decision);
  if (filters.waiting !== undefined) {
    query.whereRaw('(proposed_decision is not null) = ?', [filters.waiting ? 1 : 0]);
  }
  if (filters.cause !== undefined) query.where('cause', filters.cause);
  if (filters.zone !== undefined) query.where('zone', filters.zone);
  if (filters.ageBandIndex !== undefined) query.where('age_band', filters.ageBandIndex);
  if (filters.cohort) {
    query.where('completed_on', '>=', filters.cohort.from);
    query.where('completed_on', '<=', filters.cohort.to);
  }
  if (filters.jobRef !== undefined) query.where('job_ref', filters.jobRef);
  const text = filters.text === undefined ? '' : folded(filters.text);
  if (text !== '') {
    query.whereRaw('(instr(job_facts.search_text, ?) > 0 or instr(claims.search_text, ?) > 0)', [
      text,
      text,
    ]);
  }
  return query;
}
