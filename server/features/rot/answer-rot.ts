import type { JobFilters } from '#db/queries/job-filters';
import type { NetworkReference } from '#db/network-reference';
import type { ScopedDb } from '#db/scoped-db';
import type { RotAnswer } from '#shared/contracts/rot';
import type { Period } from '#shared/domain/period';

/** What is asked of the rot under cars. */
export interface RotQuestion {
  period: Period;
  filters: JobFilters;
}

/** Rot by age, region, zone and model. */
export function answerRot(
  _db: ScopedDb,
  _question: RotQuestion,
  _reference: NetworkReference,
): RotAnswer {
  throw new Error('not built yet');
}
