import type { JobFilters } from '#db/queries/job-filters';
import type { ScopedDb } from '#db/scoped-db';
import type { ProductNeedAnswer } from '#shared/contracts/products';
import type { Period } from '#shared/domain/period';

/** What is asked of the coming weeks' need. */
export interface NeedQuestion {
  period: Period;
  filters: JobFilters;
  today: string;
}

/** Product that the coming eight weeks are expected to take. */
export function answerProductNeed(_db: ScopedDb, _question: NeedQuestion): ProductNeedAnswer {
  throw new Error('not built yet');
}
