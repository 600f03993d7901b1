import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';

/** The target that holds for a scope (rule 80): a single branch's own, or else the network's; null when none is set. */
export function readMarginTarget(db: ScopedDb): number | null {
  const network = db.first<{ target: number | null }>(
    sql('network').select({ target: 'target_margin_share' }),
  );
  const [only, ...others] = db.scope.branches;
  const own =
    only && others.length === 0
      ? db.first<{ target: number | null }>(
          sql('branches').where({ id: only.id }).select({ target: 'target_margin_share' }),
        )
      : undefined;
  return own?.target ?? network?.target ?? null;
}
