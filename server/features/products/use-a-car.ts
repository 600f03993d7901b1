import type { BranchCell, CellSums } from '#db/queries/product-need';
import type { NormEntry } from '#db/queries/products';
import { FEWEST_CARS } from '#shared/domain/small-samples';
import type { BodyType } from '#shared/domain/vocabulary';

/** What a car takes of one product. */
export interface UseACar {
  mean: number;
  /** From car to car. */
  variance: number;
  /** Cars behind the mean; none behind a norm, which is taken as it is set. */
  cars: number | undefined;
}

/** A package and body type at a branch. */
export interface NeedCell {
  branchId: number;
  packageId: number;
  bodyType: BodyType;
}

/** What a car of a cell takes, by product id; `undefined` where neither 5 cars nor a norm tell. */
export type FindUse = (cell: NeedCell) => ReadonlyMap<number, UseACar> | undefined;

/** One text for a package and body type. */
export function kindKey({ packageId, bodyType }: Omit<NeedCell, 'branchId'>): string {
  return `${packageId} ${bodyType}`;
}

/**
 * Finds the use a car: from the branch's own cars of the package and body type when there are at least 5 of them (a car that does
 * not list a product took 0 ml), else from the norm, with the spread that such cars have within the branches of the scope.
 */
export function useACar(
  cells: readonly BranchCell[],
  sums: readonly CellSums[],
  norms: readonly NormEntry[],
): FindUse {
  const cars = new Map(cells.map((cell) => [cellKey(cell), cell.cars]));
  const own = grouped(sums, cellKey);
  const ofNorm = grouped(norms, kindKey);
  const spread = pooledVariances(cells, sums);
  return (cell) => {
    const n = cars.get(cellKey(cell)) ?? 0;
    if (n >= FEWEST_CARS) {
      return new Map(
        (own.get(cellKey(cell)) ?? []).map(({ productId, sum, squares }) => [
          productId,
          { mean: sum / n, variance: squaresAboutMean(n, sum, squares) / (n - 1), cars: n },
        ]),
      );
    }
    const lines = ofNorm.get(kindKey(cell));
    return (
      lines &&
      new Map(
        lines.map(({ productId, ml }) => [
          productId,
          { mean: ml, variance: spread(cell, productId), cars: undefined },
        ]),
      )
    );
  };
}

/** The variance of a product in a kind of car within branches, over all branches that have two such cars; 0 without any. */
function pooledVariances(
  cells: readonly BranchCell[],
  sums: readonly CellSums[],
): (cell: NeedCell, productId: number) => number {
  const degrees = new Map<string, number>();
  const cars = new Map<string, number>();
  for (const cell of cells) {
    cars.set(cellKey(cell), cell.cars);
    degrees.set(kindKey(cell), (degrees.get(kindKey(cell)) ?? 0) + cell.cars - 1);
  }
  const squares = new Map<string, number>();
  for (const line of sums) {
    const n = cars.get(cellKey(line)) ?? 0;
    const key = `${kindKey(line)} ${line.productId}`;
    squares.set(key, (squares.get(key) ?? 0) + squaresAboutMean(n, line.sum, line.squares));
  }
  return (cell, productId) => {
    const free = degrees.get(kindKey(cell)) ?? 0;
    return free > 0 ? (squares.get(`${kindKey(cell)} ${productId}`) ?? 0) / free : 0;
  };
}

/** Σ(x − x̄)² of n cars from whole sums, those that list nothing among them. */
function squaresAboutMean(n: number, sum: number, squares: number): number {
  return n === 0 ? 0 : Math.max(0, (n * squares - sum * sum) / n);
}

function cellKey({ branchId, ...kind }: NeedCell): string {
  return `${branchId} ${kindKey(kind)}`;
}

function grouped<Row>(rows: readonly Row[], key: (row: Row) => string): Map<string, Row[]> {
  const groups = new Map<string, Row[]>();
  for (const row of rows) {
    const group = groups.get(key(row));
    if (group) group.push(row);
    else groups.set(key(row), [row]);
  }
  return groups;
}
