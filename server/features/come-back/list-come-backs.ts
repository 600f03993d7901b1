import {
  iterateLeft,
  listLeft,
  type ComeBackPlace,
  type ComeBackTotals,
} from '#db/queries/come-back';
import { tellComeBack, type ComeBackRow } from '#db/queries/come-back-row';
import type { JobFilters } from '#db/queries/job-filters';
import type { ScopedDb } from '#db/scoped-db';
import type { ComeBack } from '#shared/contracts/come-back';
import type { ComeBackStatus } from '#shared/domain/vocabulary';

/** Which findings left on cars are asked for. */
export interface ComeBacksAsked {
  filters: JobFilters;
  statuses: readonly ComeBackStatus[];
}

/** A page of them. */
export interface ComeBackQuestion extends ComeBacksAsked {
  limit: number;
  after: ComeBackPlace | null;
}

export interface ComeBackPage extends ComeBackTotals {
  items: ComeBack[];
  next: ComeBackPlace | null;
}

/** Findings told at once in an export. */
const EXPORT_PIECE = 500;

/** Rot left on cars, the dangerous first. */
export function listComeBacks(db: ScopedDb, question: ComeBackQuestion): ComeBackPage {
  const { filters, statuses, limit, after } = question;
  // One more than asked for tells whether there is a next page.
  const { rows, totals } = listLeft(db, filters, statuses, after ?? undefined, limit + 1);
  const shown = rows.slice(0, limit);
  const last = rows.length > limit ? shown.at(-1) : undefined;
  return { items: shown.map(tellComeBack), next: last ? placeOfRow(last) : null, ...totals };
}

/** All of them in the same order, by pieces, for an export; the caller keeps the database from changing between them. */
export function* everyComeBack(db: ScopedDb, asked: ComeBacksAsked): Generator<ComeBack[]> {
  let piece: ComeBack[] = [];
  for (const row of iterateLeft(db, asked.filters, asked.statuses)) {
    piece.push(tellComeBack(row));
    if (piece.length === EXPORT_PIECE) {
      yield piece;
      piece = [];
    }
  }
  if (piece.length > 0) yield piece;
}

function placeOfRow(row: ComeBackRow): ComeBackPlace {
  return {
    danger: row.danger,
    completedOn: row.completed_on,
    branch: row.branch,
    jobRef: row.job_ref,
    place: row.place,
    ref: row.ref,
  };
}
