import type { JobFilters } from '#db/queries/job-filters';
import type { ScopedDb } from '#db/scoped-db';
import type { ComeBack, listComeBack } from '#shared/contracts/come-back';
import type { OutOf } from '#shared/contracts/endpoint';
import type { ComeBackStatus } from '#shared/domain/vocabulary';

/** Which findings left on cars are asked for. */
export interface ComeBacksAsked {
  filters: JobFilters;
  statuses: readonly ComeBackStatus[];
}

/** A page of them. */
export interface ComeBackQuestion extends ComeBacksAsked {
  limit: number;
  cursor: string | undefined;
}
export type ComeBackPage = OutOf<typeof listComeBack>;

/** Rot left on cars, the dangerous first. */
export function listComeBacks(_db: ScopedDb, _question: ComeBackQuestion): ComeBackPage {
  throw new Error('not built yet');
}

/** All of them in the same order, page by page, for an export. */
export function* everyComeBack(_db: ScopedDb, _asked: ComeBacksAsked): Generator<ComeBack[]> {
  throw new Error('not built yet');
}
