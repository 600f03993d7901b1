import {
  countRungs,
  readQuoteFigures,
  scopedSource,
  type QuotedCar,
  type QuoteFigures,
  type QuoteRung,
  type QuoteSource,
} from '#db/queries/quote';
import { readUsualFigures, type UsualFigures } from '#db/queries/usual';
import type { NetworkReference } from '#db/network-reference';
import type { ScopedDb } from '#db/scoped-db';
import { FEWEST_CARS } from '#shared/domain/small-samples';

/** Cars below which a set says too little to quote from (rule 48). */
export const FEWEST_QUOTE_CARS = 30;

/** The set that an answer is made from, and where its cars were. */
export interface NearestSet<Figures = QuoteFigures> {
  kind: QuoteRung;
  source: 'branch' | 'network';
  figures: Figures;
}

/** How the figures of a set are read, at the branch and in the network. */
interface Reading<Figures> {
  own: (source: QuoteSource, rung: QuoteRung) => Figures | undefined;
  network: (rungs: readonly QuoteRung[]) => { rung: QuoteRung; figures: Figures } | undefined;
}

/** Sets whose cars are of the quoted one's age, nearest first. */
const OF_AGE: readonly QuoteRung[] = ['model_age', 'body_age', 'age'];

/** The set that a quote is made from. */
export function nearestSet(
  db: ScopedDb,
  reference: NetworkReference,
  car: QuotedCar,
): NearestSet | undefined {
  return nearest(db, car, {
    own: (source, rung) => readQuoteFigures(source, car, rung),
    network: (rungs) => reference.nearestQuoteSet(car, rungs, FEWEST_QUOTE_CARS),
  });
}

/** The same set with what its cars usually take (rule 13: no figure below five cars). */
export function nearestUsualSet(
  db: ScopedDb,
  branchId: number,
  reference: NetworkReference,
  car: QuotedCar,
): NearestSet<UsualFigures> | undefined {
  return nearest(db, car, {
    own: (source, rung) =>
      readUsualFigures(source, branchId, car, rung, ({ cars }) => cars >= FEWEST_CARS),
    network: (rungs) => reference.nearestUsualSet(car, rungs, FEWEST_QUOTE_CARS, FEWEST_CARS),
  });
}

/**
 * The first set with at least 30 cars: the branch's own of this age, the network's of this age, then every car of the package,
 * the branch's before the network's (rule 48).
 */
function nearest<Figures>(
  db: ScopedDb,
  car: QuotedCar,
  read: Reading<Figures>,
): NearestSet<Figures> | undefined {
  const own = scopedSource(db);
  const [counts] = countRungs(own, car);
  const ofBranch = (rungs: readonly QuoteRung[]): NearestSet<Figures> | undefined => {
    const kind = rungs.find((rung) => (counts?.[rung] ?? 0) >= FEWEST_QUOTE_CARS);
    const figures = kind && read.own(own, kind);
    return figures && { kind, source: 'branch', figures };
  };
  const ofNetwork = (rungs: readonly QuoteRung[]): NearestSet<Figures> | undefined => {
    const found = read.network(rungs);
    return found && { kind: found.rung, source: 'network', figures: found.figures };
  };
  return ofBranch(OF_AGE) ?? ofNetwork(OF_AGE) ?? ofBranch(['package']) ?? ofNetwork(['package']);
}
