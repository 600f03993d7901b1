import { TARGET_MEASURES, type TargetMeasure } from '#shared/domain/target-measures';
import type { BranchMeasure } from '#shared/domain/vocabulary';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';

/** What is wanted of the network and of each branch in scope. */
export interface Targets {
  network: ReadonlyMap<TargetMeasure, number>;
  /** A branch's own; null where it has none. */
  own: (branchId: number, measure: TargetMeasure) => number | null;
  /** What holds for a branch: its own, or else the network's (rule 80); null where none is set, and for rot. */
  branch: (branchId: number, measure: BranchMeasure) => number | null;
}

/** Reads every target in scope. The margin's stands on the network and on the branch, where quotes read it. */
export function readTargets(db: ScopedDb): Targets {
  const network = new Map<TargetMeasure, number>(
    db
      .all<{ measure: TargetMeasure; value: number }>(
        sql('network_targets').select('measure', 'value'),
      )
      .map(({ measure, value }) => [measure, value]),
  );
  const margin = db.first<{ value: number | null }>(
    sql('network').select({ value: 'target_margin_share' }),
  )?.value;
  if (margin !== null && margin !== undefined) network.set('margin', margin);
  const own = new Map<string, number>();
  for (const { branchId, measure, value } of db.all<{
    branchId: number;
    measure: TargetMeasure;
    value: number;
  }>(db.table('branch_targets').select({ branchId: 'branch_id' }, 'measure', 'value'))) {
    own.set(nameOf(branchId, measure), value);
  }
  for (const { branchId, value } of db.all<{ branchId: number; value: number }>(
    sql('branches')
      .whereRaw('id in (select value from json_each(?))', [db.scope.idsJson])
      .whereNotNull('target_margin_share')
      .select({ branchId: 'id', value: 'target_margin_share' }),
  )) {
    own.set(nameOf(branchId, 'margin'), value);
  }
  const ownOf = (branchId: number, measure: TargetMeasure): number | null =>
    own.get(nameOf(branchId, measure)) ?? null;
  return {
    network,
    own: ownOf,
    branch: (branchId, measure) => {
      const wanted = TARGET_MEASURES.find((one) => one === measure);
      return wanted === undefined ? null : (ownOf(branchId, wanted) ?? network.get(wanted) ?? null);
    },
  };
}

function nameOf(branchId: number, measure: TargetMeasure): string {
  return `${branchId}/${measure}`;
}
