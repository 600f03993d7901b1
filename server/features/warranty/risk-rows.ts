import type { NetworkReference } from '#db/network-reference';
import type { ScopedDb } from '#db/scoped-db';
import type { WarrantyRiskRow } from '#shared/contracts/warranty-reports';
import type { RiskQuestion } from './warranty-question';

/** The warranty-risk rows, by branch and completion half-year (rule 51); asked with the scope of the whole network. */
export function warrantyRiskRows(
  _db: ScopedDb,
  _question: RiskQuestion,
  _network: NetworkReference,
): WarrantyRiskRow[] {
  throw new Error('not there yet');
}
