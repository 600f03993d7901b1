import {
  countRungs,
  readQuoteFigures,
  scopedSource,
  type QuotedCar,
  type QuoteFigures,
  type QuoteRung,
} from '#db/queries/quote';
import type { NetworkReference } from '#db/network-reference';
import type { ScopedDb } from '#db/scoped-db';

/** Cars below which a set says too little to quote from (rule 48). */
export const FEWEST_QUOTE_CARS = 30;

/** The set that a quote is made from, and where its cars were. */
export interface NearestSet {
  kind: QuoteRung;
  source: 'branch' | 'network';
  figures: QuoteFigures;
}

/** Sets whose cars are of the quoted one's age, nearest first. */
const OF_AGE: readonly QuoteRung[] = ['model_age', 'body_age', 'age'];

/**
 * The first set with at least 30 cars: the branch's own of this age, the network's of this age, then every car of the package,
 * the branch's before the network's (rule 48).
 */
export function nearestSet(
  db: ScopedDb,
  reference: NetworkReference,
  car: QuotedCar,
): NearestSet | undefined {
  const own = scopedSource(db);
  const [counts] = countRungs(own, car);
  const ofBranch = (rungs: readonly QuoteRung[]): NearestSet | undefined => {
    const kind = rungs.find((rung) => (counts?.[rung] ?? 0) >= FEWEST_QUOTE_CARS);
    const figures = kind && readQuoteFigures(own, car, kind);
    return figures && { kind, source: 'branch', figures };
  };
  const ofNetwork = (rungs: readonly QuoteRung[]): NearestSet | undefined => {
    const found = reference.nearestQuoteSet(car, rungs, FEWEST_QUOTE_CARS);
    return found && { kind: found.rung, source: 'network', figures: found.figures };
  };
  return ofBranch(OF_AGE) ?? ofNetwork(OF_AGE) ?? ofBranch(['package']) ?? ofNetwork(['package']);
}
