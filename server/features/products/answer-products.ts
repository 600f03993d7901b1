import type { JobFilters } from '#db/queries/job-filters';
import { packageCodes } from '#db/queries/overrun';
import {
  countCarCells,
  listUncostedProducts,
  productCodes,
  readNormedCars,
  readNorms,
  readProductLines,
  sumUncosted,
  type CarCell,
  type NormedCars,
  type ProductLines,
} from '#db/queries/products';
import type { ScopedDb } from '#db/scoped-db';
import type { ProductBranch, ProductsAnswer, ProductUse } from '#shared/contracts/products';
import type { Period } from '#shared/domain/period';
import { BODY_TYPES, type BodyType } from '#shared/domain/vocabulary';
import { normRatio } from './norm-ratio';
import { useByTemperature } from './use-by-temperature';
import { costPerCar, useFigures } from './use-figures';

/** What is asked of product use. */
export interface ProductsQuestion {
  period: Period;
  filters: JobFilters;
}

/**
 * Product a car against its norm; one snapshot of the database. A job is without cost here when the cost of a product that went
 * into it was not known: what else it wants is no concern of product (rule 11).
 */
export function answerProducts(
  db: ScopedDb,
  { period, filters }: ProductsQuestion,
): ProductsAnswer {
  return db.snapshot(() => {
    const asked = { ...filters, ...period };
    const cells = countCarCells(db, asked);
    const lines = readProductLines(db, asked);
    const normed = readNormedCars(db, asked);
    // Nearly always every line has its cost: then no job need be looked at for one that has not.
    const uncosted = lines.every(({ ml, costedLines }) => costedLines === ml.length)
      ? { jobs: 0, costCents: 0 }
      : sumUncosted(db, asked);
    const jobs = sum(cells.map(({ cars }) => cars));
    const known = sum(lines.map(({ costCents }) => costCents)) - uncosted.costCents;
    const codes = productCodes(db);
    return {
      period,
      scope: db.scope.echo(),
      jobs,
      withoutCost: uncosted.jobs,
      missingCosts:
        uncosted.jobs === 0
          ? []
          : listUncostedProducts(db, asked).map((missing) => ({ kind: 'product', ...missing })),
      overall: {
        ...normRatio({
          used: normed.flatMap(({ used }) => used),
          foreseen: normed.flatMap(({ foreseen }) => foreseen),
        }),
        costedCars: jobs - uncosted.jobs,
        costPerCarCents: costPerCar(known, jobs - uncosted.jobs),
      },
      use: useOf(db, codes, cells, lines),
      branches: branchesOf(db, normed),
      temperature: temperatureOf(codes, lines),
    };
  });
}

/** A row a product, package and body type that has a car, in the order of those (rule 37). */
function useOf(
  db: ScopedDb,
  codes: ReadonlyMap<number, string>,
  cells: readonly CarCell[],
  lines: readonly ProductLines[],
): ProductUse[] {
  const packages = packageCodes(db);
  const cars = new Map(cells.map((cell) => [cellKey(cell), cell.cars]));
  const used = new Map(lines.map((own) => [lineKey(own), own]));
  const norms = new Map(
    readNorms(db)
      .filter((norm) => cars.has(cellKey(norm)))
      .map((norm) => [lineKey(norm), norm]),
  );
  return [...new Map<string, Line>([...norms, ...used])]
    .map(([key, { packageId, bodyType, productId }]) => {
      const own = used.get(key);
      const norm = norms.get(key);
      const ml = own?.ml ?? [];
      return {
        product: codes.get(productId) ?? '',
        package: packages.get(packageId) ?? '',
        bodyType,
        ...useFigures({
          cars: norm ? (cars.get(cellKey(norm)) ?? 0) : ml.length,
          ml,
          normMl: norm?.ml ?? null,
          costCents: own?.costCents ?? 0,
          costedLines: own?.costedLines ?? 0,
        }),
      };
    })
    .sort(
      (a, b) =>
        byText(a.product, b.product) ||
        byText(a.package, b.package) ||
        BODY_TYPES.indexOf(a.bodyType) - BODY_TYPES.indexOf(b.bodyType),
    );
}

/** Every branch with cars that have a norm, in the order of their codes. */
function branchesOf(db: ScopedDb, normed: readonly NormedCars[]): ProductBranch[] {
  const byId = new Map(normed.map((cars) => [cars.branchId, cars]));
  return db.scope.branches.flatMap(({ id, code }) => {
    const cars = byId.get(id);
    return cars ? [{ branch: code, ...normRatio(cars) }] : [];
  });
}

/** Every product that went into a car of known temperature, in the order of their codes. */
function temperatureOf(
  codes: ReadonlyMap<number, string>,
  lines: readonly ProductLines[],
): ProductsAnswer['temperature'] {
  return [...codes]
    .sort(([, a], [, b]) => byText(a, b))
    .map(([id, code]) =>
      useByTemperature(
        code,
        lines.filter(({ productId }) => productId === id),
      ),
    )
    .filter(({ cars }) => cars > 0);
}

interface Cell {
  packageId: number;
  bodyType: BodyType;
}

interface Line extends Cell {
  productId: number;
}

function cellKey({ packageId, bodyType }: Cell): string {
  return `${packageId} ${bodyType}`;
}

function lineKey({ productId, ...cell }: Line): string {
  return `${cellKey(cell)} ${productId}`;
}

function byText(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}

function sum(values: readonly number[]): number {
  return values.reduce((all, value) => all + value, 0);
}
