import { type CostBook, type CostChange } from '#shared/domain/cost-book';
import type { RecordedJob } from '#shared/domain/recorded-job';
import { sql, type Connection } from './database';
import {
  deriveRows,
  endDerived,
  insertDerived,
  sameRows,
  sweepDerived,
  type DerivedRows,
} from './derived-rows';
import type { JobIdentity } from './queries/fact-row';
import type { Store } from './store';
import { NO_END } from './tables';

/** Job ids that one commit looks at: few enough that other writes wait only a few milliseconds. */
const SLICE = 200;

interface TouchedRow extends JobIdentity {
  branchCode: string;
  content: string;
}

/**
 * Restates derived rows after a change of costs: the rows it touches are computed again into a new generation, slice by
 * slice, while reads keep seeing the old one and jobs that arrive get a row in both; the change itself and the switch are one
 * commit. One restatement runs at a time.
 */
export class Restatement {
  private last: Promise<unknown> = Promise.resolve();

  constructor(private readonly store: Store) {}

  /** Applies a change; `record` writes the change itself (and its audit entry) in the commit of the switch. Returns how many jobs got other figures. */
  apply<T>(change: CostChange, record: () => T): Promise<{ restatedJobs: number; recorded: T }> {
    const run = this.last.then(() => this.run(change, record));
    this.last = run.catch(() => undefined);
    return run;
  }

  private async run<T>(
    change: CostChange,
    record: () => T,
  ): Promise<{ restatedJobs: number; recorded: T }> {
    const { queue, state, writing } = this.store;
    const next = state.costs.with(change);
    const { generation } = state;
    try {
      await queue.write(() => {
        // What a restatement that could not even be taken back has left behind, a full disk for one.
        recoverGenerations(writing);
        writing.prepare('update network set restating = 1').run();
        state.nextCosts = next;
      });
      let restatedJobs = 0;
      await this.everySlice((from, to) => {
        restatedJobs += this.restateSlice(change, next, generation, from, to);
      });
      const recorded = await queue.write(() => {
        const value = record();
        writing.prepare('update network set generation = ?').run(generation + 1);
        state.nextCosts = undefined;
        state.reload();
        return value;
      });
      await this.everySlice((after, to) => sweepDerived(writing, generation + 1, { after, to }));
      await queue.write(() => writing.prepare('update network set restating = 0').run());
      return { restatedJobs, recorded };
    } catch (error) {
      state.nextCosts = undefined;
      await queue.write(() => {
        recoverGenerations(writing);
        state.reload();
      });
      throw error;
    }
  }

  /** Runs a piece of work over all job ids, a slice a commit, so that other writes get between. Jobs that come meanwhile are written whole already. */
  private async everySlice(work: (from: number, to: number) => void): Promise<void> {
    const { queue, writing } = this.store;
    const last = lastJobId(writing);
    for (let from = 0; from < last; from += SLICE) {
      await queue.write(() => work(from, from + SLICE));
    }
  }

  private restateSlice(
    change: CostChange,
    next: CostBook,
    generation: number,
    from: number,
    to: number,
  ): number {
    const { writing, state } = this.store;
    let restated = 0;
    for (const row of touchedRows(writing, change, next, generation, from, to)) {
      const job = JSON.parse(row.content) as RecordedJob;
      const before = deriveRows(row, row.branchCode, job, state.costs, state);
      const now = deriveRows(row, row.branchCode, job, next, state);
      if (sameRows(before, now)) continue;
      restateJob(writing, row, now, generation);
      restated += 1;
    }
    return restated;
  }
}

/**
 * Brings derived rows back to one whole generation after a stop in the middle of a restatement: takes back what was written
 * for the next one and removes what no reader can see. At start, before anyone reads.
 */
export function recoverGenerations(connection: Connection): void {
  const network = connection.prepare('select generation, restating from network').get() as {
    generation: number;
    restating: number;
  };
  if (network.restating === 0) return;
  const { generation } = network;
  for (const table of ['job_facts', 'job_products']) {
    connection.prepare(`delete from ${table} where gen_from > ?`).run(generation);
    connection
      .prepare(`update ${table} set gen_to = ? where gen_to > ? and gen_to < ?`)
      .run(NO_END, generation, NO_END);
  }
  sweepDerived(connection, generation, { after: 0, to: lastJobId(connection) });
  connection.prepare('update network set restating = 0').run();
}

function lastJobId(connection: Connection): number {
  const row = connection.prepare('select max(id) as last from jobs').get() as {
    last: number | null;
  };
  return row.last ?? 0;
}

/** The jobs of a slice whose figures the change may touch, a superset kept simple: by branch and date for rates, by date or norm key else. */
function touchedRows(
  connection: Connection,
  change: CostChange,
  next: CostBook,
  generation: number,
  from: number,
  to: number,
): TouchedRow[] {
  const query = sql('job_facts as f')
    .join('branches', 'branches.id', 'f.branch_id')
    .join('job_revisions as r', (join) =>
      join.on('r.job_id', 'f.job_id').andOn('r.revision', 'f.revision'),
    )
    .where('f.job_id', '>', from)
    .where('f.job_id', '<=', to)
    // A row that begins in the next generation belongs to a job that came meanwhile and is written already.
    .where('f.gen_from', '<=', generation)
    .where('f.gen_to', NO_END)
    .select({
      jobId: 'f.job_id',
      branchId: 'f.branch_id',
      jobRef: 'f.job_ref',
      revision: 'f.revision',
      packageId: 'f.package_id',
      warrantyMonths: 'f.warranty_months',
      branchCode: 'branches.code',
      content: 'r.content',
    });
  if (change.kind === 'norm') {
    query
      .where('f.body_type', change.bodyType)
      .whereIn('f.package_id', sql('packages').where({ code: change.package }).select('id'));
  } else {
    const reach = next.reach(change);
    query.where('f.completed_on', '>=', reach.from);
    if (reach.before !== null) query.where('f.completed_on', '<', reach.before);
    if (change.kind === 'hourlyCost') query.where('branches.code', change.code);
  }
  return connection.all<TouchedRow>(query);
}

function restateJob(
  connection: Connection,
  id: JobIdentity,
  rows: DerivedRows,
  generation: number,
): void {
  endDerived(connection, id.jobId, generation + 1);
  insertDerived(connection, id, rows, { from: generation + 1, to: NO_END });
}
