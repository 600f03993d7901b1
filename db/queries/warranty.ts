import type { Knex } from 'knex';
import type { ClaimCause, ClaimDecision, Zone } from '#shared/domain/vocabulary';
import { CHECKS, type CheckAnswer } from '#shared/domain/vocabulary';
import { sql, type Query } from '../database';
import type { ScopedDb } from '../scoped-db';
import { whereJobs, type JobFilters } from './job-filters';

/** What cover is counted by, one place a car in every list, day by day. */
export interface CoverLists {
  packageIds: number[];
  /** Places in `AGE_BANDS`. */
  bands: number[];
  completedOn: string[];
  warrantyMonths: number[];
}

/** The cars of a question, one place a car in every list. */
export interface WarrantyCars extends CoverLists {
  branchIds: number[];
  jobIds: number[];
  /** How each was worked, as `practiceOf` reads it. */
  practices: number[];
}

/** How a car was worked: its checks in their order, and whether it got much less product than its norm. */
export interface Practice {
  checks: (CheckAnswer | undefined)[];
  /** Undefined without a norm. */
  thin: boolean | undefined;
}

/** A claim as it stands. */
export interface ClaimRow {
  jobId: number;
  madeOn: string;
  decision: ClaimDecision;
  decidedOn: string | null;
  waiting: 0 | 1;
  zone: Zone;
  cause: ClaimCause;
  costCents: number;
  paidOn: string | null;
}

/** What decides whether a claim of the network counts, with what its car is counted by. */
export interface CoveredClaim {
  branchId: number;
  packageId: number;
  band: number;
  completedOn: string;
  warrantyMonths: number;
  madeOn: string;
  decision: ClaimDecision;
  decidedOn: string | null;
  cause: ClaimCause;
}

/** Who runs a query: a reader of a scope, or one beyond every scope. */
interface Reader {
  all: <Row>(query: Query) => Row[];
}

/** More than there are age bands, and more than any warranty has months. */
const [BANDS, MONTHS] = [8, 1024];

/** One number a car instead of three lists, which would take twice as long. */
const COVER = {
  completedOn: 'completed_on',
  sold: `(package_id * ${BANDS} + age_band) * ${MONTHS} + warranty_months`,
} as const;

/** Answers to a check, none, yes, no and not applicable, as figures of a number with base 4. */
const ANSWERS: readonly (CheckAnswer | undefined)[] = [undefined, 'yes', 'no', 'na'];
const ENOUGH: readonly (boolean | undefined)[] = [undefined, false, true];

/** One number a car instead of seven lists: thin first, then the checks, the last of them lowest. */
const PRACTICE = CHECKS.map(checkColumn).reduce(
  (before, column) =>
    `4 * (${before}) + case ${column} when 'yes' then 1 when 'no' then 2 when 'na' then 3 else 0 end`,
  // Whole numbers on both sides: 0.7 of a norm is not always a number that can be written exactly.
  'case when norm_ml = 0 then 0 when 10 * normed_ml < 7 * norm_ml then 2 else 1 end',
);

/** Reads every car once: figures are told by so many things that each would sort them all again. */
export function readWarrantyCars(db: ScopedDb, filters: JobFilters): WarrantyCars {
  const columns = { ...COVER, branchIds: 'branch_id', jobIds: 'job_id', practices: PRACTICE };
  const row = db.first<Record<keyof typeof columns, string>>(
    whereJobs(db.table('job_facts'), filters).select(listsOf(columns)),
  );
  return {
    ...coverLists(row),
    branchIds: listOf(row?.branchIds),
    jobIds: listOf(row?.jobIds),
    practices: listOf(row?.practices),
  };
}

/** How a car was worked, out of its number. */
export function practiceOf(number: number): Practice {
  const checks = CHECKS.map((_, place) => {
    const figure = Math.floor(number / 4 ** (CHECKS.length - 1 - place)) % 4;
    return ANSWERS[figure];
  });
  return { checks, thin: ENOUGH[Math.floor(number / 4 ** CHECKS.length)] };
}

/** Every claim in scope made by a day, void jobs' and other jobs' too: whoever has read the cars knows which are asked for. */
export function readClaims(db: ScopedDb, asOf: string): ClaimRow[] {
  return db.all<ClaimRow>(
    db
      .table('claims')
      .where('made_on', '<=', asOf)
      .orderBy('claims.id')
      .select({
        jobId: 'job_id',
        madeOn: 'made_on',
        decision: 'decision',
        decidedOn: 'decided_on',
        waiting: sql.raw('proposed_decision is not null'),
        zone: 'zone',
        cause: 'cause',
        costCents: 'cost_cents',
        paidOn: 'paid_on',
      }),
  );
}

/** What cover is counted by, branch by branch, of whichever facts a reader beyond scope asks for. */
export function readCoverByBranch(
  reader: Reader,
  facts: Knex.QueryBuilder,
): (CoverLists & { branchId: number })[] {
  return reader
    .all<Record<keyof typeof COVER, string> & { branchId: number }>(
      facts.groupBy('branch_id').select({ branchId: 'branch_id' }, listsOf(COVER)),
    )
    .map(({ branchId, ...lists }) => ({ branchId, ...coverLists(lists) }));
}

/** The claims made by a day on whichever facts a reader asks for; `claims` are those of the reader. */
export function readCoveredClaims(
  reader: Reader,
  facts: Knex.QueryBuilder,
  asOf: string,
  claims: Knex.Raw = sql.raw('claims'),
): CoveredClaim[] {
  return reader.all<CoveredClaim>(coveredClaims(facts, asOf, claims));
}

/** The claims of a scope made by a day on cars asked for, in the order in which they came, each with its car's reference. */
export function readClaimsOnCars(
  db: ScopedDb,
  filters: JobFilters,
  asOf: string,
): (CoveredClaim & { ref: string })[] {
  return db.all(
    coveredClaims(whereJobs(db.table('job_facts'), filters), asOf, db.derived('claims'))
      .orderBy('claims.id')
      .select({ ref: 'job_facts.job_ref' }),
  );
}

function coveredClaims(
  facts: Knex.QueryBuilder,
  asOf: string,
  claims: Knex.Raw,
): Knex.QueryBuilder {
  return facts
    .join(claims, 'claims.job_id', 'job_facts.job_id')
    .where('claims.made_on', '<=', asOf)
    .select({
      branchId: 'job_facts.branch_id',
      packageId: 'job_facts.package_id',
      band: 'job_facts.age_band',
      completedOn: 'job_facts.completed_on',
      warrantyMonths: 'job_facts.warranty_months',
      madeOn: 'claims.made_on',
      decision: 'claims.decision',
      decidedOn: 'claims.decided_on',
      cause: 'claims.cause',
    });
}

function checkColumn(check: string): string {
  return `check_${check.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`)}`;
}

function listsOf(columns: Readonly<Record<string, string>>): Knex.Raw {
  const lists = Object.entries(columns).map(
    ([name, column]) => `json_group_array(${column}) as ${name}`,
  );
  return sql.raw(lists.join(', '));
}

function coverLists(row: Record<keyof typeof COVER, string> | undefined): CoverLists {
  const sold = listOf<number>(row?.sold);
  return {
    completedOn: listOf(row?.completedOn),
    packageIds: sold.map((one) => Math.floor(one / MONTHS / BANDS)),
    bands: sold.map((one) => Math.floor(one / MONTHS) % BANDS),
    warrantyMonths: sold.map((one) => one % MONTHS),
  };
}

function listOf<Value>(list: string | undefined): Value[] {
  return JSON.parse(list ?? '[]') as Value[];
}
