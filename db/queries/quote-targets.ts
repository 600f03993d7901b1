import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';

/** The margin targets that a quote of the scope's branch may follow, its own before the network's (rule 80). */
export function readQuoteTargets(
  db: ScopedDb,
  branchId: number,
): { branch: number | null; network: number | null } {
  const row = db.first<{ branch: number | null; network: number | null }>(
    sql('branches').joinRaw('cross join network').where('branches.id', branchId).select({
      branch: 'branches.target_margin_share',
      network: 'network.target_margin_share',
    }),
  );
  return row ?? { branch: null, network: null };
}
