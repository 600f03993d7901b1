import type { Knex } from 'knex';
import { claimStanding } from '#shared/domain/claim-standing';
import type { FunnelCell } from '#shared/domain/funnel';
import { dayNumber } from '#shared/domain/calendar';
import type { Period } from '#shared/domain/period';
import { CoverBook, DAYS_A_YEAR } from '#shared/domain/warranty-cover';
import {
  AGE_BANDS,
  CLAIM_CAUSES,
  STAGES,
  type BranchMeasure,
  type ClaimCause,
} from '#shared/domain/vocabulary';
import { sql, type Query } from '../database';
import type { ScopedDb } from '../scoped-db';
import { whereJobs, type JobFilters } from './job-filters';
import { readCoverByBranch, readCoveredClaims } from './warranty';

/** Where cars come from: those of a scope, or every car there is. Each gives a derived table of its own rows. */
export interface FunnelSource {
  facts: () => Knex.QueryBuilder;
  products: () => Knex.Raw;
  claims: () => Knex.Raw;
  all: <Row>(query: Query) => Row[];
}

/** What is asked of a funnel: cars by completion, and the day up to which claims and cover count. */
export interface FunnelAsked {
  measure: BranchMeasure;
  filters: JobFilters;
  today: string;
  /** Whether the products of the measure `product` are wanted one by one as well. */
  products?: 'apart';
  /** Cover and claims of these days only, whenever a car was finished; else of all days up to today. */
  within?: Period;
}

/** A cell of one branch. */
export interface BranchFunnelCell extends FunnelCell {
  branchId: number;
}

/** More than there are age bands. */
const BANDS = 8;
/** Claims are told for a thousand car-years. */
const DAYS = 1000 * DAYS_A_YEAR;

/** Lines of cost that part a margin share, in the order of the bridge; revenue itself is the same 1 for everybody. */
export const MARGIN_PARTS = [
  'revenue',
  'plannedLabour',
  'rotLabour',
  'product',
  'consumables',
  'fee',
] as const;

const MARGIN_COLUMNS = [
  'revenue_cents',
  '-labour_cents',
  '-repair_labour_cents',
  '-product_cents',
  '-(consumables_cents + bought_in_cents)',
  '-fee_cents',
];

/** How a measure is summed over the facts: which cars, what divides, and the parts of what is divided. */
export const SUMMED: Record<
  Exclude<BranchMeasure, 'claims'>,
  { counted: Readonly<Record<string, number>>; e: string; a: string; parts: readonly string[] }
> = {
  overrun: {
    counted: { has_estimate: 1 },
    e: 'est_minutes',
    a: 'act_minutes',
    parts: STAGES.map((stage) => `act_${stage}`),
  },
  rot: {
    counted: {},
    e: '1',
    a: 'has_rot',
    parts: AGE_BANDS.map((_, band) => `has_rot * (age_band = ${band})`),
  },
  product: { counted: {}, e: 'norm_ml', a: 'normed_ml', parts: ['normed_ml'] },
  margin: {
    counted: { billed: 1, costed: 1 },
    e: 'revenue_cents',
    a: 'margin_cents',
    parts: MARGIN_COLUMNS,
  },
};

/** The source that holds the rows of a scope. */
export function scopedFunnelSource(db: ScopedDb): FunnelSource {
  return {
    facts: () => db.table('job_facts'),
    products: () => db.derived('job_products'),
    claims: () => db.derived('claims'),
    all: (query) => db.all(query),
  };
}

/** Sums of every branch by age band and package; product in one part (`readProductParts` has them product by product). */
export function readFunnelCells(source: FunnelSource, asked: FunnelAsked): BranchFunnelCell[] {
  return asked.measure === 'claims'
    ? claimCells(source, asked)
    : summedCells(source, asked.measure, asked.filters);
}

/** Millilitres of normed products, product by product: what the one part of a product cell is made of. */
export function readProductParts(
  source: FunnelSource,
  filters: JobFilters,
): { branchId: number; key: number; productId: number; ml: number }[] {
  return source.all(
    whereJobs(source.facts(), filters)
      .join(source.products(), (on) =>
        on
          .on('job_products.branch_id', 'job_facts.branch_id')
          .on('job_products.completed_on', 'job_facts.completed_on')
          .on('job_products.job_id', 'job_facts.job_id'),
      )
      .join('norms', (on) =>
        on
          .on('norms.package_id', 'job_facts.package_id')
          .on('norms.body_type', 'job_facts.body_type')
          .on('norms.product_id', 'job_products.product_id'),
      )
      .where('job_facts.norm_ml', '>', 0)
      .groupByRaw('1, 2, 3')
      .select(
        sql.raw(`job_facts.branch_id as "branchId", ${keyOf('job_facts.')} as key,
          job_products.product_id as "productId", sum(job_products.ml) as ml`),
      ),
  );
}

/** Narrows a query over the facts to the cars that a measure counts. */
export function whereCounted(
  query: Knex.QueryBuilder,
  measure: Exclude<BranchMeasure, 'claims'>,
): Knex.QueryBuilder {
  query.where(SUMMED[measure].counted);
  return measure === 'product' ? query.where('norm_ml', '>', 0) : query;
}

function summedCells(
  source: FunnelSource,
  measure: Exclude<BranchMeasure, 'claims'>,
  filters: JobFilters,
): BranchFunnelCell[] {
  const { e, a, parts } = SUMMED[measure];
  // Squares of cents would overrun whole numbers of 64 bits, so they are added up as fractions.
  const sums = [
    'branch_id as "branchId"',
    `${keyOf('')} as key`,
    'count(*) as cars',
    `sum(${e}) as e`,
    `sum(1.0 * ${a} * ${a}) as aa`,
    `sum(1.0 * ${a} * ${e}) as ae`,
    `sum(1.0 * ${e} * ${e}) as ee`,
    ...parts.map((part, place) => `sum(${part}) as part${place}`),
  ];
  const query = whereCounted(whereJobs(source.facts(), filters), measure);
  return source
    .all<Omit<BranchFunnelCell, 'parts'> & Record<`part${number}`, number>>(
      query.groupByRaw('1, 2').select(sql.raw(sums.join(', '))),
    )
    .map((row) => ({
      branchId: row.branchId,
      key: row.key,
      cars: row.cars,
      e: row.e,
      aa: row.aa,
      ae: row.ae,
      ee: row.ee,
      parts: parts.map((_, place) => row[`part${place}`] as number),
    }));
}

/** Cover run by today in thousands of car-years, and counted claims by cause (rules 14 and 16). */
function claimCells(
  source: FunnelSource,
  { filters: asked, today, within }: FunnelAsked,
): BranchFunnelCell[] {
  // Where it is tomorrow already, a branch may have finished cars that are under no cover yet.
  const to = asked.to !== undefined && asked.to < today ? asked.to : today;
  const filters = { ...asked, to };
  const book = new CoverBook(today);
  const cells = new Map<string, BranchFunnelCell & { days: number; parts: number[] }>();
  const cellOf = (branchId: number, key: number) => {
    const name = `${branchId}/${key}`;
    let cell = cells.get(name);
    if (!cell) {
      const parts = CLAIM_CAUSES.map(() => 0);
      cell = { branchId, key, cars: 0, e: 0, days: 0, parts, aa: 0, ae: 0, ee: 0 };
      cells.set(name, cell);
    }
    return cell;
  };
  for (const cars of readCoverByBranch(source, whereJobs(source.facts(), filters))) {
    for (let car = 0; car < cars.completedOn.length; car += 1) {
      const months = cars.warrantyMonths[car] as number;
      const completedOn = cars.completedOn[car] as string;
      const cover = book.coverOf(completedOn, months);
      if (!cover) continue;
      const days = within ? daysWithin(completedOn, cover.end, within) : cover.daysRun;
      if (within && days === 0) continue;
      const key = (cars.packageIds[car] as number) * BANDS + (cars.bands[car] as number);
      const cell = cellOf(cars.branchId, key);
      cell.cars += 1;
      cell.days += days;
    }
  }
  const made = readCoveredClaims(
    source,
    whereJobs(source.facts(), filters),
    today,
    source.claims(),
  );
  for (const claim of made) {
    const end = book.coverOf(claim.completedOn, claim.warrantyMonths)?.end;
    if (claimStanding(claim, end, today) !== 'counted') continue;
    if (within && (claim.madeOn < within.from || claim.madeOn > within.to)) continue;
    const { parts } = cellOf(claim.branchId, claim.packageId * BANDS + claim.band);
    const cause = placeOf(claim.cause);
    parts[cause] = (parts[cause] as number) + 1;
  }
  return [...cells.values()].map(({ days, ...cell }) => ({ ...cell, e: days / DAYS }));
}

/** Days of the cover (completedOn, end] that lie in a stretch. */
function daysWithin(completedOn: string, end: string, { from, to }: Period): number {
  const first = completedOn < from ? dayNumber(from) : dayNumber(completedOn) + 1;
  const last = dayNumber(end < to ? end : to);
  return Math.max(0, last - first + 1);
}

function placeOf(cause: ClaimCause): number {
  return CLAIM_CAUSES.indexOf(cause);
}

function keyOf(table: '' | 'job_facts.'): string {
  return `${table}package_id * ${BANDS} + ${table}age_band`;
}
