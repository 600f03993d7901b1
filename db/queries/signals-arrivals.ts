import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import { leftFindings } from './come-back-parts';

/** The hours (`2026-01-28T17`, UTC) in which a branch's jobs finished since a day first arrived, oldest first; its last day of work. */
export interface ArrivalRow {
  branchId: number;
  closedOn: string | null;
  hours: string[];
}

/** When new jobs arrived, branch by branch; jobs finished long before tell nothing of a branch's habits. */
export function readArrivals(db: ScopedDb, since: string): ArrivalRow[] {
  const hours = db
    .table('job_facts')
    .join('job_revisions as r', 'r.job_id', 'job_facts.job_id')
    .where('r.revision', 1)
    .where('job_facts.completed_on', '>=', since)
    .distinct({ branch_id: 'job_facts.branch_id' })
    .select(sql.raw('substr(r.received_at, 1, 13) as hour'));
  return db
    .all<{ branchId: number; closedOn: string | null; hours: string }>(
      sql
        .from(hours.as('arrived'))
        .join('branches', 'branches.id', 'arrived.branch_id')
        .groupBy('branches.id')
        .orderBy('branches.id')
        .select(
          { branchId: 'branches.id', closedOn: 'branches.closed_on' },
          sql.raw('json_group_array(arrived.hour) as hours'),
        ),
    )
    .map(({ hours: list, ...row }) => ({ ...row, hours: (JSON.parse(list) as string[]).sort() }));
}

/** Dangerous rot left on a car, with the day that was set for it. */
export interface DangerRow {
  branch: string;
  ref: string;
  dueOn: string;
  ownerToldOn: string | null;
}

/** Dangerous findings left on cars that still stand open and were due before a day, the earliest day first. */
export function listDangersDue(db: ScopedDb, before: string): DangerRow[] {
  return db.all<DangerRow>(
    sql
      .withMaterialized('left_findings', leftFindings(db))
      .from('left_findings as c')
      .whereRaw(`c.status in ('open', 'contacted', 'booked') and c.due_on < ?`, [before])
      // As `isDangerous` has it: rot where the car bears load.
      .whereRaw(
        `c.structural = 1 and (c.seen_as <> 'surface' or coalesce(c.worked_as, 'surface') <> 'surface')`,
      )
      .orderBy(['c.due_on', 'c.branch', 'c.job_ref', 'c.ref'])
      .select({
        branch: 'c.branch',
        ref: 'c.job_ref',
        dueOn: 'c.due_on',
        ownerToldOn: 'c.owner_told_on',
      }),
  );
}
