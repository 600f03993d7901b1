import { sql, type Connection } from './database';
import { countRungs, type QuotedCar, type QuoteRung, type QuoteSource } from './queries/quote';
import { VISIBLE } from './visible-rows';

/** Branch by branch, so that the days asked for are found within each. */
const EVERY_FACT = `(select * from job_facts where branch_id in (select id from branches) and ${VISIBLE}) as job_facts`;
/** The visible product lines of every branch. */
export const EVERY_PRODUCT = `(select * from job_products where ${VISIBLE}) as job_products`;

/** What must stand behind a set of the network's cars. */
export interface QuoteNeed {
  cars: number;
  /** Branches besides the quoted one. */
  others: number;
}

/** Reads the figures of a set: sums and quantiles, never rows. */
export type ReadFigures<Figures> = (
  source: QuoteSource,
  car: QuotedCar,
  rung: QuoteRung,
) => Figures | undefined;

/**
 * The figures of the nearest set of the network's cars with enough cars and other branches behind it (rule 48). Sums and
 * quantiles only; they depend on the branch quoted for and on nobody who asks.
 */
export function nearestNetworkSet<Figures>(
  connection: Connection,
  branchId: number,
  car: QuotedCar,
  rungs: readonly QuoteRung[],
  need: QuoteNeed,
  read: ReadFigures<Figures>,
): { rung: QuoteRung; figures: Figures } | undefined {
  const source = everySource(connection);
  const counts = countRungs(source, car);
  for (const rung of rungs) {
    const behind = counts.filter((row) => row[rung] > 0);
    const cars = behind.reduce((all, row) => all + row[rung], 0);
    const others = behind.filter((row) => row.branchId !== branchId).length;
    if (cars >= need.cars && others >= need.others) {
      const figures = read(source, car, rung);
      return figures && { rung, figures };
    }
  }
  return undefined;
}

function everySource(connection: Connection): QuoteSource {
  return {
    facts: () => sql.from(sql.raw(EVERY_FACT)),
    products: () => sql.raw(EVERY_PRODUCT),
    consumables: () => sql.raw('job_consumables'),
    all: (query) => connection.all(query),
  };
}
