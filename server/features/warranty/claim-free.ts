import type { ClaimFreeMonth } from '#shared/contracts/warranty';
import { FEWEST_CARS } from '#shared/domain/small-samples';
import { kaplanMeier } from '#shared/stats/kaplan-meier';
import type { CarsAsked } from './cars-asked';

/** Cars and first claims by month since completion (rule 17). */
export interface ClaimFreeTimes {
  cars: number;
  /** Cars with a claim. */
  claims: number;
  /** Month 1 first: cars at risk in it, and first claims. */
  steps: { atRisk: number; events: number }[];
}

/** How long the cars of each group were seen without a claim; a car without a warranty is in none. */
export function claimFreeTimes<Key>(
  { covers, firstClaims }: CarsAsked,
  groupOf: (car: number) => Key,
): Map<Key, ClaimFreeTimes> {
  const groups = new Map<Key, { last: number[]; events: number[] }>();
  covers.forEach((cover, car) => {
    if (!cover) return;
    const key = groupOf(car);
    let group = groups.get(key);
    if (!group) groups.set(key, (group = { last: [], events: [] }));
    const claimed = firstClaims.get(car);
    add(group.last, claimed ?? cover.lastMonth);
    if (claimed !== undefined) add(group.events, claimed);
  });
  return new Map([...groups].map(([key, group]) => [key, timesOf(group)]));
}

/** Some groups as one. */
export function allTimes(groups: Iterable<ClaimFreeTimes>): ClaimFreeTimes {
  const all: ClaimFreeTimes = { cars: 0, claims: 0, steps: [] };
  for (const { cars, claims, steps } of groups) {
    all.cars += cars;
    all.claims += claims;
    steps.forEach(({ atRisk, events }, index) => {
      const step = (all.steps[index] ??= { atRisk: 0, events: 0 });
      step.atRisk += atRisk;
      step.events += events;
    });
  }
  return all;
}

/** The share still without a claim after each month, withheld where fewer than five cars were at risk in it. */
export function claimFreeMonths({ steps }: ClaimFreeTimes): ClaimFreeMonth[] {
  const shares = kaplanMeier(steps);
  return steps.map(({ atRisk, events }, index) => {
    const step = atRisk < FEWEST_CARS ? undefined : shares[index];
    return {
      month: index + 1,
      atRisk,
      claims: events,
      share: step?.survival ?? null,
      lower: step?.lower ?? null,
      upper: step?.upper ?? null,
    };
  });
}

/** A car is at risk through the month of its claim, or through the last one in which it was seen. */
function timesOf({ last, events }: { last: number[]; events: number[] }): ClaimFreeTimes {
  const steps: ClaimFreeTimes['steps'] = [];
  let [atRisk, claims] = [0, 0];
  for (let month = last.length - 1; month >= 1; month -= 1) {
    atRisk += last[month] ?? 0;
    claims += events[month] ?? 0;
    steps.unshift({ atRisk, events: events[month] ?? 0 });
  }
  return { cars: atRisk, claims, steps };
}

function add(months: number[], month: number): void {
  months[month] = (months[month] ?? 0) + 1;
}
