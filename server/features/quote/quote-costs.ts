import type { CostsOfDay } from '#db/queries/costs-of-day';
import type { QuoteFigures } from '#db/queries/quote';
import { fraction, plus, type Fraction } from '#shared/domain/quote-price';

/** What the set's cars cost at today's rates, line by line; a line that wants a cost is absent, and what it wants is named. */
export interface QuoteCosts {
  labour: Fraction | undefined;
  product: Fraction | undefined;
  consumablesAndBoughtIn: Fraction | undefined;
  missing: { kind: string; code: string }[];
}

/**
 * P80 labour, mean product, mean consumables and bought-in, all at today's rates and none of them rounded (rule 49): unlike a
 * job's lines they are of no car that was billed.
 */
export function quoteCosts(figures: QuoteFigures, branch: string, costs: CostsOfDay): QuoteCosts {
  const { cars, minutes, products, ownCents, unpriced } = figures;
  const missing: QuoteCosts['missing'] = [];
  const noted = (kind: string, code: string, cost: number | undefined): number | undefined => {
    if (cost === undefined) missing.push({ kind, code });
    return cost;
  };
  const hourly = noted('hourlyCost', branch, costs.hourlyCents.get(branch));
  noted('fee', 'network', costs.feeMicros);
  const product = added(
    products.map(({ product: code, ml }) => {
      const cost = noted('product', code, costs.litreCents.get(code));
      return cost === undefined ? undefined : fraction(ml, cars * 1000, cost);
    }),
  );
  const pieces = added(
    unpriced.map(({ kind, quantity }) => {
      const cost = noted('consumable', kind, costs.pieceCents.get(kind));
      return cost === undefined ? undefined : fraction(quantity, cars, cost);
    }),
  );
  return {
    labour: hourly === undefined ? undefined : fraction(minutes.p80Fifths, 5 * 60, hourly),
    product,
    consumablesAndBoughtIn: pieces && plus(pieces, fraction(ownCents, cars)),
    missing,
  };
}

function added(lines: readonly (Fraction | undefined)[]): Fraction | undefined {
  return lines.reduce<Fraction | undefined>(
    (all, line) => all && line && plus(all, line),
    fraction(0, 1),
  );
}
