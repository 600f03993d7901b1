import type { NetworkReference } from '#db/network-reference';
import type { ScopedDb } from '#db/scoped-db';
import type { WarrantyAnswer } from '#shared/contracts/warranty';
import type { WarrantyQuestion } from './warranty-question';

/** Everything about warranty as of a day; one snapshot of the database. */
export function answerWarranty(
  _db: ScopedDb,
  _question: WarrantyQuestion,
  _network: NetworkReference,
): WarrantyAnswer {
  throw new Error('not there yet');
}
