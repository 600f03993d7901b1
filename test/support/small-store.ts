import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { BranchWriter, type Receipt } from '#db/branch-writer';
import { sql } from '#db/database';
import {
  putBranchRow,
  putCost,
  putPackageRow,
  putProductRow,
  putRegionRow,
} from '#db/queries/set-up';
import { Scope, type ScopedBranch } from '#db/scope';
import { Store } from '#db/store';
import { FROM_THE_START, type CostChange } from '#shared/domain/cost-book';
import { normaliseJob, type SentJob } from '#shared/domain/normalise-job';
import type { RecordedJob } from '#shared/domain/recorded-job';

/** What the tests of `db/` write as: nobody in particular. */
export const RECEIPT: Receipt = {
  actor: { label: 'system', personId: null, pushKeyId: null, address: 'local' },
  source: 'person',
  receivedAt: '2026-02-02T06:30:00.000Z',
};

const BRANCHES = ['AAA', 'BBB', 'CCC'];
const FIRST_DAY = '2020-01-01';

/** The costs that a small store begins with. */
export const COSTS: readonly CostChange[] = [
  { kind: 'fee', from: FROM_THE_START, value: 50_000 },
  ...BRANCHES.map((code) => ({ kind: 'hourlyCost', code, from: FIRST_DAY, value: 3600 }) as const),
  { kind: 'product', code: 'CW1', from: FIRST_DAY, value: 1200 },
  { kind: 'norm', package: 'full', bodyType: 'van', lines: [{ product: 'CW1', ml: 4000 }] },
];

/** A data folder with three branches, two products and two packages, opened without a server. */
export class SmallStore {
  private constructor(
    readonly folder: string,
    readonly store: Store,
  ) {}

  /** Makes one in a folder of its own. */
  static async make(): Promise<SmallStore> {
    const folder = mkdtempSync(join(tmpdir(), 'underseam-store-'));
    const store = await Store.open(folder);
    await store.queue.write(() => {
      const db = store.unscoped;
      putRegionRow(db, { code: 'COAST', name: 'Coast', climate: null });
      for (const code of BRANCHES) {
        putBranchRow(db, { ...BRANCH, code, name: code });
      }
      for (const code of ['CW1', 'UW1']) {
        putProductRow(db, { code, name: code, kind: 'cavity_wax' });
      }
      putPackageRow(db, { code: 'full', name: 'Full', warrantyMonths: 36 });
      putPackageRow(db, { code: 'cavity', name: 'Cavity', warrantyMonths: 24 });
      for (const cost of COSTS) putCost(db, cost);
      store.state.reload();
    });
    return new SmallStore(folder, store);
  }

  /** Opens one that was left behind. */
  static async reopen(folder: string): Promise<SmallStore> {
    return new SmallStore(folder, await Store.open(folder));
  }

  branch(code: string): ScopedBranch {
    const found = this.store.state.branches.find((branch) => branch.code === code);
    if (!found) throw new Error(`the small store has no branch ${code}`);
    return found;
  }

  /** The scope of some branches. */
  scope(...codes: string[]): Scope {
    const branchIds = codes.map((code) => this.branch(code).id);
    const grant = { role: 'site_manager', branchIds, regionCodes: [] } as const;
    return Scope.ofGrant(this.store.state.branches, grant);
  }

  /** Writes a job, new or as a correction. */
  putJob(branch: string, jobRef: string, sent: SentJob = {} as SentJob): Promise<void> {
    return this.store.queue.write(() => this.write(branch, jobRef, sent));
  }

  /** The same inside a write that is under way. */
  write(branch: string, jobRef: string, sent: Partial<SentJob>): void {
    const writer = new BranchWriter(this.store, this.branch(branch));
    const job = normaliseJob({ ...PLAIN, ...sent } as SentJob & {
      invoice?: RecordedJob['invoice'];
    });
    const text = JSON.stringify(job);
    const stored = writer.findJob(jobRef);
    if (!stored) writer.createJob(jobRef, job, text, RECEIPT);
    else writer.replaceJob(jobRef, stored, job, text, RECEIPT);
  }

  /** Voids a job. */
  voidJob(branch: string, jobRef: string): Promise<void> {
    return this.store.queue.write(() => {
      const writer = new BranchWriter(this.store, this.branch(branch));
      const stored = writer.findJob(jobRef);
      if (stored) writer.voidJob(jobRef, stored, RECEIPT);
    });
  }

  /** Changes a cost as set-up does, without its audit entry. */
  async change(change: CostChange): Promise<number> {
    const { restatedJobs } = await this.store.restatement.apply(change, () =>
      putCost(this.store.unscoped, change),
    );
    return restatedJobs;
  }

  /** Rows of a table, past every scope: for looking at what a test has done. */
  count(table: string): number {
    const row = this.store.unscoped.first<{ n: number }>(sql(table).count({ n: '*' }));
    return row?.n ?? 0;
  }

  /** Closes the store; its folder goes too unless it is kept. */
  close(after: 'remove' | 'keep' = 'remove'): void {
    this.store.close();
    if (after === 'remove') rmSync(this.folder, { recursive: true, force: true });
  }
}

const BRANCH = {
  region: 'COAST',
  timeZone: 'Europe/Berlin',
  openedOn: '2015-01-01',
  closedOn: null,
  targetMarginShare: null,
};

const PLAIN: SentJob = {
  vehicle: { make: 'Vela', model: 'Ono', bodyType: 'van', firstRegistered: '2010-01' },
  package: 'full',
  completedOn: '2026-01-28',
  estimate: { priceCents: 50_000, stages: { strip: 60, apply: 120 } },
  actual: { stages: { strip: 70, apply: 130, repair: 30 } },
  products: [{ product: 'CW1', ml: 3900 }],
  invoice: { number: '1', issuedOn: '2026-01-29', totalCents: 60_000 },
};
