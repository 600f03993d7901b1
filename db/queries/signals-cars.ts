import type { BranchMeasure } from '#shared/domain/vocabulary';
import { STAGES } from '#shared/domain/vocabulary';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';

/** Estimated cars of a branch, one place a car in every list; cells are package and age band as one number. */
export interface TimedCarLists {
  branchId: number;
  refs: string[];
  completedOn: string[];
  cells: number[];
  estimated: number[];
  actual: number[];
}

/** The minutes of every estimated car finished between two days, branch by branch. */
export function readTimedCars(db: ScopedDb, from: string, to: string): TimedCarLists[] {
  const columns: Record<Exclude<keyof TimedCarLists, 'branchId'>, string> = {
    refs: 'job_ref',
    completedOn: 'completed_on',
    cells: 'package_id * 8 + age_band',
    estimated: 'est_minutes',
    actual: 'act_minutes',
  };
  return db
    .all<Record<keyof typeof columns, string> & { branchId: number }>(
      db
        .table('job_facts')
        .where('has_estimate', 1)
        .whereBetween('completed_on', [from, to])
        .groupBy('branch_id')
        .orderBy('branch_id')
        .select(
          { branchId: 'branch_id' },
          sql.raw(
            Object.entries(columns)
              .map(([name, text]) => `json_group_array(${text}) as "${name}"`)
              .join(', '),
          ),
        ),
    )
    .map(({ branchId, refs, completedOn, cells, estimated, actual }) => ({
      branchId,
      refs: JSON.parse(refs) as string[],
      completedOn: JSON.parse(completedOn) as string[],
      cells: JSON.parse(cells) as number[],
      estimated: JSON.parse(estimated) as number[],
      actual: JSON.parse(actual) as number[],
    }));
}

/** References of a branch's billed cars finished between two days, the newest first. */
export function listBilledCars(
  db: ScopedDb,
  branchId: number,
  { from, to }: { from: string; to: string },
  limit: number,
): string[] {
  return db
    .all<{ ref: string }>(
      db
        .table('job_facts')
        .where({ branch_id: branchId, billed: 1, costed: 1 })
        .whereBetween('completed_on', [from, to])
        .orderBy([{ column: 'completed_on', order: 'desc' }, { column: 'job_id' }])
        .limit(limit)
        .select({ ref: 'job_ref' }),
    )
    .map(({ ref }) => ref);
}

/** What of a car moves its branch upward in a measure, and which cars count; claims are listed by the claims themselves. */
const MOVES: Record<BranchMeasure, { counted: string; by: string }> = {
  overrun: { counted: 'has_estimate = 1', by: 'act_minutes - est_minutes' },
  rot: { counted: '1 = 1', by: 'has_rot' },
  claims: {
    counted: 'exists (select 1 from json_each(?) as made where made.value = job_facts.job_id)',
    by: 'completed_on',
  },
  product: { counted: 'norm_ml > 0', by: 'normed_ml - norm_ml' },
  margin: { counted: 'billed = 1 and costed = 1', by: 'margin_cents' },
};

/** References of the cars of a branch that move it most to one side of a measure. */
export function listMovingCars(
  db: ScopedDb,
  branchId: number,
  measure: BranchMeasure,
  asked: { from: string; to: string; side: 'low' | 'high'; claimed: readonly number[] },
  limit: number,
): string[] {
  const { counted, by } = MOVES[measure];
  const bound = measure === 'claims' ? [JSON.stringify(asked.claimed)] : [];
  return db
    .all<{ ref: string }>(
      db
        .table('job_facts')
        .where('branch_id', branchId)
        .whereBetween('completed_on', [asked.from, asked.to])
        .whereRaw(counted, bound)
        .orderByRaw(`${by} ${asked.side === 'high' ? 'desc' : 'asc'}, completed_on desc, job_id`)
        .limit(limit)
        .select({ ref: 'job_ref' }),
    )
    .map(({ ref }) => ref);
}

/** An unbilled car; `costCents` null where a cost is not known (rule 11). */
export interface UnbilledRow {
  branchId: number;
  ref: string;
  completedOn: string;
  costCents: number | null;
}

/** Cars without an invoice that were finished before a day, the oldest first. */
export function listUnbilledBefore(db: ScopedDb, before: string): UnbilledRow[] {
  const cost = [
    ...['labour_cents', 'repair_labour_cents', 'product_cents'],
    ...['consumables_cents', 'bought_in_cents'],
  ].join(' + ');
  return db.all<UnbilledRow>(
    db
      .table('job_facts')
      .where('billed', 0)
      .where('completed_on', '<', before)
      .orderBy(['completed_on', 'job_id'])
      .select({
        branchId: 'branch_id',
        ref: 'job_ref',
        completedOn: 'completed_on',
        costCents: sql.raw(`iif(costed = 1, ${cost}, null)`),
      }),
  );
}

/** A car with what may be odd of it, and whether every stage took its estimate to the minute. */
export interface CheckedRow {
  branchId: number;
  ref: string;
  completedOn: string;
  timed: 0 | 1;
  copied: 0 | 1;
  longestStage: number;
  mostMl: number;
  zeroPrice: 0 | 1;
  zeroBill: 0 | 1;
}

/** Every car finished between two days, the newest first, with what would be odd of it. */
export function listCheckedCars(db: ScopedDb, from: string, to: string): CheckedRow[] {
  const most = db
    .table('job_products', 'p')
    .whereRaw(
      'p.branch_id = job_facts.branch_id and p.completed_on = job_facts.completed_on and p.job_id = job_facts.job_id',
    )
    .max('p.ml');
  return db.all<CheckedRow>(
    db
      .table('job_facts')
      .join('job_revisions as r', (join) =>
        join.on('r.job_id', '=', 'job_facts.job_id').andOn('r.revision', '=', 'job_facts.revision'),
      )
      .whereBetween('job_facts.completed_on', [from, to])
      .orderBy([
        { column: 'job_facts.completed_on', order: 'desc' },
        { column: 'job_facts.job_id', order: 'desc' },
      ])
      .select({
        branchId: 'job_facts.branch_id',
        ref: 'job_facts.job_ref',
        completedOn: 'job_facts.completed_on',
        timed: 'job_facts.has_estimate',
        copied: sql.raw(STAGES.map((stage) => `est_${stage} = act_${stage}`).join(' and ')),
        longestStage: sql.raw(`max(${STAGES.map((stage) => `act_${stage}`).join(', ')})`),
        mostMl: sql.raw('coalesce((?), 0)', [most]),
        zeroPrice: sql.raw(`coalesce(r.content ->> '$.estimate.priceCents' = 0, 0)`),
        zeroBill: sql.raw(`coalesce(r.content ->> '$.invoice.totalCents' = 0, 0)`),
      }),
  );
}
