import type { ScopedDb } from '#db/scoped-db';
import {
  MOST_CURVES,
  type CurveGroup,
  type ClaimFreeGroup,
  type WarrantyAnswer,
} from '#shared/contracts/warranty';
import { AGE_BANDS } from '#shared/domain/vocabulary';
import { logRank } from '#shared/stats/log-rank';
import type { CarsAsked } from './cars-asked';
import { claimFreeMonths, claimFreeTimes, type ClaimFreeTimes } from './claim-free';

/** The times of one group of cars. */
export type KeyedTimes = ClaimFreeTimes & { key: string };

/** Every group with a car under warranty, in the order of its key. */
export function everyGroup(
  asked: CarsAsked,
  by: CurveGroup,
  scope: ScopedDb['scope'],
  packageCodes: ReadonlyMap<number, string>,
): KeyedTimes[] {
  const times = claimFreeTimes(asked, keyFor(asked, by, scope, packageCodes));
  // Age bands stand in their own order, half-years and codes in that of their text.
  const place = (key: string): number => (AGE_BANDS as readonly string[]).indexOf(key);
  return [...times]
    .map(([key, group]) => ({ key, ...group }))
    .sort((one, other) =>
      by === 'ageBand' ? place(one.key) - place(other.key) : one.key < other.key ? -1 : 1,
    );
}

/** The groups asked for, else those with the most cars. */
export function shownGroups(
  groups: readonly KeyedTimes[],
  asked: readonly string[] | undefined,
): KeyedTimes[] {
  if (asked) return groups.filter(({ key }) => asked.includes(key));
  const most = [...groups].sort((one, other) => other.cars - one.cars).slice(0, MOST_CURVES);
  return groups.filter((group) => most.includes(group));
}

/** A group as it is told. */
export function curveOf(group: KeyedTimes): ClaimFreeGroup {
  const { key, cars, claims } = group;
  return { key, cars, claims, months: claimFreeMonths(group) };
}

/** Whether the groups differ by more than chance; null with fewer than two or without a claim. */
export function compareGroups(groups: readonly KeyedTimes[]): WarrantyAnswer['logRank'] {
  const test = logRank(groups.map(({ steps }) => steps));
  return (
    (test && {
      ...test,
      groups: test.groups.map((sums, index) => ({ key: groups[index]?.key ?? '', ...sums })),
    }) ??
    null
  );
}

function keyFor(
  { cars, cohorts }: CarsAsked,
  by: CurveGroup,
  scope: ScopedDb['scope'],
  packageCodes: ReadonlyMap<number, string>,
): (car: number) => string {
  switch (by) {
    case 'package':
      return (car) => packageCodes.get(cars.packageIds[car] as number) ?? '';
    case 'ageBand':
      return (car) => AGE_BANDS[cars.bands[car] as number] as string;
    case 'cohort':
      return (car) => cohorts[car] as string;
    case 'branch':
    case 'region': {
      const names = new Map(
        scope.branches.map(({ id, code, region }) => [id, by === 'branch' ? code : region]),
      );
      return (car) => names.get(cars.branchIds[car] as number) ?? '';
    }
  }
}
