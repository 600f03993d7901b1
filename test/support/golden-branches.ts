import type { NetworkReference } from '#db/network-reference';
import { readBranchWeeks } from '#db/queries/branch-weeks';
import { readFunnelCells, readProductParts, scopedFunnelSource } from '#db/queries/branches';
import { countCosted } from '#db/queries/count-costed';
import type { JobFilters } from '#db/queries/job-filters';
import { readReceivedThrough } from '#db/queries/received-through';
import type { ScopedDb } from '#db/scoped-db';
import { BRANCH_MEASURES } from '#shared/domain/vocabulary';

type Read = (db: ScopedDb, filters: JobFilters, network: NetworkReference) => unknown;

const TODAY = '2026-02-02';

/** What branches are compared by, as golden files name it. */
export const BRANCH_READS: Readonly<Record<string, Read>> = {
  'count-costed': countCosted,
  'network-funnel-cells-of-claims': (_db, filters, network) =>
    network.funnelCells({ measure: 'claims', filters, today: TODAY }),
  'network-funnel-cells-of-product': (_db, filters, network) =>
    network.funnelCells({ measure: 'product', filters, today: TODAY, products: 'apart' }),
  'read-branch-weeks': (db, filters) => readBranchWeeks(db, 'margin', filters),
  ...Object.fromEntries(
    BRANCH_MEASURES.map((measure): [string, Read] => [
      `read-funnel-cells-of-${measure}`,
      (db, filters) => readFunnelCells(scopedFunnelSource(db), { measure, filters, today: TODAY }),
    ]),
  ),
  'read-product-parts': (db, filters) => readProductParts(scopedFunnelSource(db), filters),
  'read-received-through': readReceivedThrough,
};
