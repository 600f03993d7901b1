import type { SignalFacts } from '#shared/domain/signal-facts';
import type { Period } from '#shared/domain/period';
import { OPEN_COME_BACKS, type BranchMeasure, type SignalKind } from '#shared/domain/vocabulary';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import { visibleSignals } from './signals';
import { leftFindings } from './come-back-parts';

/** What waits to be dealt with in a scope. */
export interface Waiting {
  unbilled: number;
  /** Completion of the one that waits longest; null when none does. */
  oldestUnbilledOn: string | null;
  /** Findings of rot where the car bears load, left on it, whose day has come. */
  dangerousDue: number;
  /** Signals that nobody has acknowledged. */
  signals: number;
}

/** A signal as a digest tells it. */
export interface DigestSignal {
  branch: string;
  branchName: string;
  region: string;
  kind: SignalKind;
  measure: BranchMeasure | null;
  since: string;
  openedOn: string;
  overOn: string | null;
  strength: number;
  facts: SignalFacts;
  cars: number;
}

/** An action agreed with a branch that is past its day. */
export interface LateAction {
  branchName: string;
  region: string;
  what: string;
  who: string;
  until: string;
}

/** What a branch finished and kept in a stretch of days. */
export interface BranchCars {
  branch: string;
  branchName: string;
  region: string;
  cars: number;
  /** Of its billed cars with all their costs. */
  costed: number;
  revenueCents: number;
  marginCents: number;
  /** Newest completion ever received; null when none was. */
  newestOn: string | null;
}

/** What waits in a scope on a day. */
export function readWaiting(db: ScopedDb, today: string): Waiting {
  const unbilled = db.first<{ cars: number; oldest: string | null }>(
    db
      .table('job_facts')
      .where({ billed: 0 })
      .select(sql.raw('count(*) as cars, min(completed_on) as oldest')),
  );
  const due = db.first<{ n: number }>(
    sql
      .with('c', leftFindings(db))
      .from('c')
      .whereRaw('c.status in (select value from json_each(?))', [JSON.stringify(OPEN_COME_BACKS)])
      // Dangerous as `isDangerous` has it: rot where the car bears load.
      .whereRaw(
        `c.structural = 1 and (c.seen_as <> 'surface' or coalesce(c.worked_as, 'surface') <> 'surface')`,
      )
      .where('c.due_on', '<=', today)
      .count({ n: '*' }),
  );
  const signals = db.first<{ n: number }>(
    visibleSignals(db).whereNull('over_on').whereNull('acknowledged_at').count({ n: '*' }),
  );
  return {
    unbilled: unbilled?.cars ?? 0,
    oldestUnbilledOn: unbilled?.oldest ?? null,
    dangerousDue: due?.n ?? 0,
    signals: signals?.n ?? 0,
  };
}

/** Billed cars of some days with all their costs: those behind a margin. */
export function countBehindMargin(db: ScopedDb, { from, to }: Period): number {
  const row = db.first<{ n: number }>(
    db
      .table('job_facts')
      .where({ billed: 1, costed: 1 })
      .whereBetween('completed_on', [from, to])
      .count({ n: '*' }),
  );
  return row?.n ?? 0;
}

/** Signals that are not over, or have been since a day (that day included); by branch, the longest standing first. */
export function readDigestSignals(db: ScopedDb, overSince: string): DigestSignal[] {
  return db
    .all<Omit<DigestSignal, 'facts'> & { facts: string }>(
      visibleSignals(db)
        .join('branches', 'branches.id', 's.branch_id')
        .join('regions', 'regions.id', 'branches.region_id')
        .whereRaw('(over_on is null or over_on >= ?)', [overSince])
        .orderBy(['branches.code', 's.opened_on', 's.id'])
        .select('kind', 'measure', 'since', 'strength', 'facts', 'cars', {
          branch: 'branches.code',
          branchName: 'branches.name',
          region: 'regions.code',
          openedOn: 's.opened_on',
          overOn: 'over_on',
        }),
    )
    .map((row) => ({ ...row, facts: JSON.parse(row.facts) as SignalFacts }));
}

/** Actions under way that are past their day, the latest-standing first. */
export function readLateActions(db: ScopedDb, today: string): LateAction[] {
  return db.all<LateAction>(
    db
      .table('actions')
      .join('branches', 'branches.id', 'actions.branch_id')
      .join('regions', 'regions.id', 'branches.region_id')
      .where({ state: 'agreed' })
      .where('until_on', '<', today)
      .orderBy(['until_on', 'branches.code', 'actions.id'])
      .select('what', 'who', {
        branchName: 'branches.name',
        region: 'regions.code',
        until: 'until_on',
      }),
  );
}

/** What each branch in scope finished in some days, by code; a branch without cars too. */
export function readBranchCars(db: ScopedDb, { from, to }: Period): BranchCars[] {
  const sums = new Map(
    db
      .all<Omit<BranchCars, 'branch' | 'branchName' | 'region'> & { branchId: number }>(
        db
          .table('job_facts')
          .groupBy('branch_id')
          .select(
            { branchId: 'branch_id' },
            sql.raw(
              `count(*) filter (where completed_on between ? and ?) as cars,
              count(*) filter (where completed_on between ? and ? and billed = 1 and costed = 1) as costed,
              coalesce(sum(revenue_cents) filter (where completed_on between ? and ? and billed = 1 and costed = 1), 0) as "revenueCents",
              coalesce(sum(margin_cents) filter (where completed_on between ? and ? and billed = 1 and costed = 1), 0) as "marginCents",
              max(completed_on) as "newestOn"`,
              [from, to, from, to, from, to, from, to],
            ),
          ),
      )
      .map((row) => [row.branchId, row]),
  );
  return db.scope.branches.map(({ id, code, name, region }) => {
    const { branchId: _branchId, ...row } = sums.get(id) ?? { branchId: id, ...NOTHING };
    return { branch: code, branchName: name, region, ...row };
  });
}

/** Warranty-risk reports issued in some days; only whoever sees the whole network is told of any. */
export function readIssued(db: ScopedDb, { from, to }: Period): { id: number; asOf: string }[] {
  if (!db.scope.ofNetwork) return [];
  return db.all<{ id: number; asOf: string }>(
    sql('warranty_reports')
      .whereRaw('substr(issued_at, 1, 10) between ? and ?', [from, to])
      .orderBy('id')
      .select('id', { asOf: 'as_of' }),
  );
}

/** Names of the regions in scope by code. */
export function readRegionNames(db: ScopedDb): Record<string, string> {
  const { regions } = db.scope.echo();
  const rows = db.all<{ code: string; name: string }>(
    sql('regions')
      .whereRaw('code in (select value from json_each(?))', [JSON.stringify(regions)])
      .select('code', 'name'),
  );
  return Object.fromEntries(rows.map(({ code, name }) => [code, name]));
}

const NOTHING = { cars: 0, costed: 0, revenueCents: 0, marginCents: 0, newestOn: null };
