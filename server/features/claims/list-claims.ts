import {
  iterateClaimRows,
  listClaimRows,
  sumClaims,
  type ClaimFilters,
  type ClaimPlace,
  type ClaimSort,
} from '#db/queries/claim-list';
import type { ScopedDb } from '#db/scoped-db';
import type { ClaimRow } from '#shared/contracts/claim-list';
import { tellClaim } from './tell-claim';

/** Which claims, as of which day, in which order, for whose eyes. */
export interface ClaimsAsked {
  filters: ClaimFilters;
  asOf: string;
  sort: ClaimSort;
  money: 'seen' | 'unseen';
}

export interface ClaimListQuestion extends ClaimsAsked {
  after: ClaimPlace | null;
  limit: number;
}

export interface ClaimPage {
  items: ClaimRow[];
  next: ClaimPlace | null;
  /** All claims that match, and their cost where the reader sees money. */
  claims: number;
  costCents?: number;
}

/** Claims told at once in an export. */
const EXPORT_PIECE = 500;

/** One page of the claims in scope. */
export function listClaims(db: ScopedDb, question: ClaimListQuestion): ClaimPage {
  const { filters, asOf, sort, money, after, limit } = question;
  return db.snapshot(() => {
    // One more than asked for tells whether there is a next page.
    const rows = listClaimRows(db, filters, asOf, sort, after ?? undefined, limit + 1);
    const shown = rows.slice(0, limit);
    const last = rows.length > limit ? shown.at(-1) : undefined;
    const { claims, costCents } = sumClaims(db, filters, asOf);
    return {
      items: shown.map((row) => tellClaim(row, money)),
      next: last
        ? {
            key: last.sortKey,
            completedOn: last.completed_on,
            branch: last.branch,
            jobRef: last.job_ref,
            claimRef: last.claim_ref,
          }
        : null,
      claims,
      ...(money === 'seen' && { costCents }),
    };
  });
}

/** Every claim in scope in its order, by pieces; the caller keeps the database from changing between them. */
export function* everyClaim(db: ScopedDb, asked: ClaimsAsked): Generator<ClaimRow[]> {
  let piece: ClaimRow[] = [];
  for (const row of iterateClaimRows(db, asked.filters, asked.asOf, asked.sort)) {
    piece.push(tellClaim(row, asked.money));
    if (piece.length === EXPORT_PIECE) {
      yield piece;
      piece = [];
    }
  }
  if (piece.length > 0) yield piece;
}
