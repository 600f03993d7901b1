import {
  MARGIN_PARTS,
  readFunnelCells,
  readProductParts,
  scopedFunnelSource,
} from '#db/queries/branches';
import { countCosted } from '#db/queries/count-costed';
import type { JobFilters } from '#db/queries/job-filters';
import { listMissingCosts } from '#db/queries/margin';
import { productCodes } from '#db/queries/products';
import type { NetworkReference } from '#db/network-reference';
import type { ScopedBranch } from '#db/scope';
import type { ScopedDb } from '#db/scoped-db';
import {
  funnelReference,
  placeInFunnel,
  type FunnelCell,
  type FunnelPlace,
  type FunnelReference,
} from '#shared/domain/funnel';
import type { MissingCost } from '#shared/domain/job-figures';
import type { Period } from '#shared/domain/period';
import { AGE_BANDS, CLAIM_CAUSES, STAGES, type BranchMeasure } from '#shared/domain/vocabulary';

/** What is asked when branches are compared. */
export interface BranchesQuestion {
  measure: BranchMeasure;
  period: Period;
  filters: JobFilters;
  /** The latest local date in scope: claims and cover count up to it, a week is over when its Sunday has passed. */
  today: string;
}

/** The branches of a scope that have cars, each in its funnel. */
export interface PlacedBranches {
  jobs: number;
  money: { withoutCost: number; missingCosts: MissingCost[] };
  kind: 'network' | 'scope';
  reference: FunnelReference;
  /** What the parts of a value are. */
  parts: readonly string[];
  places: { branch: ScopedBranch; place: FunnelPlace; claims: number }[];
}

/** Reads and places; products are told one by one only where they are wanted `apart`. */
export function placeBranches(
  db: ScopedDb,
  reference: NetworkReference,
  { measure, period, filters, today }: BranchesQuestion,
  products?: 'apart',
): PlacedBranches {
  const asked = { measure, filters: { ...filters, ...period }, today };
  const apart = measure === 'product' ? products : undefined;
  const codes = apart ? productCodes(db) : undefined;
  const keys = [...(codes?.keys() ?? [])].sort((a, b) =>
    codeOf(codes, a) < codeOf(codes, b) ? -1 : 1,
  );
  const source = scopedFunnelSource(db);
  const own = readFunnelCells(source, asked);
  const ownParts = apart ? readProductParts(source, asked.filters) : [];
  const {
    kind,
    cells,
    products: allParts,
  } = reference.funnelCells({
    ...asked,
    ...(apart && { products: apart }),
  });
  const compared = funnelReference(measure, apart ? withProducts(cells, allParts, keys) : cells);
  const { jobs, withoutCost, wanting } = countCosted(db, asked.filters);
  const isMoney = measure === 'margin';
  return {
    jobs,
    money: {
      withoutCost: isMoney ? withoutCost : 0,
      missingCosts: isMoney && wanting > 0 ? listMissingCosts(db, asked.filters) : [],
    },
    kind,
    reference: compared,
    parts: codes ? keys.map((id) => codeOf(codes, id)) : PARTS[measure],
    places: db.scope.branches.flatMap((branch) => {
      const mine = own.filter(({ branchId }) => branchId === branch.id);
      if (mine.length === 0) return [];
      const lines = ownParts.filter(({ branchId }) => branchId === branch.id);
      const place = placeInFunnel(apart ? withProducts(mine, lines, keys) : mine, compared);
      const claims = mine.flatMap(({ parts }) => parts).reduce((sum, part) => sum + part, 0);
      return [{ branch, place, claims }];
    }),
  };
}

const PARTS: Readonly<Record<BranchMeasure, readonly string[]>> = {
  overrun: STAGES,
  rot: AGE_BANDS,
  claims: CLAIM_CAUSES,
  product: ['product'],
  margin: MARGIN_PARTS,
};

/** Cells whose one part is dealt out to the products it is made of. */
function withProducts(
  cells: readonly FunnelCell[],
  lines: readonly { key: number; productId: number; ml: number }[],
  products: readonly number[],
): FunnelCell[] {
  const byKey = new Map<number, number[]>();
  for (const { key, productId, ml } of lines) {
    const parts = byKey.get(key) ?? products.map(() => 0);
    const place = products.indexOf(productId);
    parts[place] = (parts[place] ?? 0) + ml;
    byKey.set(key, parts);
  }
  const none = products.map(() => 0);
  return cells.map((cell) => ({ ...cell, parts: byKey.get(cell.key) ?? none }));
}

function codeOf(codes: ReadonlyMap<number, string> | undefined, id: number): string {
  return codes?.get(id) ?? '';
}
