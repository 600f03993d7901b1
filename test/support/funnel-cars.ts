import fc from 'fast-check';
import type { FunnelCell } from '#shared/domain/funnel';

/** A car as the funnel counts it: what it adds, part by part, and what it divides by. */
export interface Car {
  key: number;
  branch: number;
  parts: [number, number];
  e: number;
}

/** Any such car. */
export const drawnCar = fc.record({
  key: fc.integer({ min: 0, max: 5 }),
  branch: fc.integer({ min: 0, max: 3 }),
  parts: fc.tuple(fc.integer({ min: -20, max: 200 }), fc.integer({ min: 0, max: 90 })),
  e: fc.integer({ min: 1, max: 150 }),
});
/** A car like the others, but for what is given. */
export function aCar(car: Partial<Car> = {}): Car {
  return { key: 1, branch: 0, parts: [40, 20], e: 100, ...car };
}

/** What a car adds in all. */
export function a({ parts }: Car): number {
  return parts[0] + parts[1];
}

/** The rate of the cars of a cell, counted one by one. */
export function rateBy(cars: readonly Car[], key: number): number {
  const own = cars.filter((one) => one.key === key);
  return sum(own.map(a)) / sum(own.map(({ e }) => e));
}

/** The cells that cars fall into. */
export function cellsOf(cars: readonly Car[]): FunnelCell[] {
  return [...new Set(cars.map(({ key }) => key))].map((key) => {
    const own = cars.filter((one) => one.key === key);
    return {
      key,
      cars: own.length,
      e: sum(own.map(({ e }) => e)),
      parts: [0, 1].map((part) => sum(own.map(({ parts }) => parts[part]!))),
      aa: sum(own.map((one) => a(one) ** 2)),
      ae: sum(own.map((one) => a(one) * one.e)),
      ee: sum(own.map(({ e }) => e * e)),
    };
  });
}

/** A plain sum. */
export function sum(values: readonly number[]): number {
  return values.reduce((total, value) => total + value, 0);
}
