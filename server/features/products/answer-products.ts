import type { JobFilters } from '#db/queries/job-filters';
import type { ScopedDb } from '#db/scoped-db';
import type { ProductsAnswer } from '#shared/contracts/products';
import type { Period } from '#shared/domain/period';

/** What is asked of product use. */
export interface ProductsQuestion {
  period: Period;
  filters: JobFilters;
}

/** Product a car against its norm. */
export function answerProducts(_db: ScopedDb, _question: ProductsQuestion): ProductsAnswer {
  throw new Error('not built yet');
}
