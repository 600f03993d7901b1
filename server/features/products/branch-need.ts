import { compoundSum, type MeanAndVariance } from '#shared/stats/compound-sum';
import type { UsualCars } from './usual-cars';
import type { UseACar } from './use-a-car';

/** One package and body type that a branch has had or expects. */
export interface NeedKind {
  /** Cars of it in the period: the branch's usual mix. */
  past: number;
  /** Cars of it in the diary of the coming weeks. */
  booked: number;
  /** What one takes, by product id; `undefined` where nothing tells. */
  use: ReadonlyMap<number, UseACar> | undefined;
}

/** What is known of a branch's coming weeks. */
export interface BranchOutlook {
  /** Cars in the diary, week by week. */
  bookedByWeek: readonly number[];
  /** Whether the branch is there in each week. */
  open: readonly boolean[];
  usual: UsualCars | undefined;
  kinds: readonly NeedKind[];
}

/** What a branch's coming weeks are expected to bring and to take. */
export interface BranchNeed {
  /** Stand-ins, week by week (rule 75). */
  standIns: number[];
  /** Expected millilitres and their variance, by product id. */
  products: Map<number, MeanAndVariance>;
  carsWithoutUse: number;
}

/**
 * Adds a branch's coming weeks up. Cars in the diary come as booked; where fewer are booked than usually come, stand-ins make the
 * week up to the usual number, in the branch's usual mix. The number of stand-ins varies as the branch's weeks did, in proportion
 * to what is not booked yet. The variance holds what varies from car to car, from week to week and in the mix, and the error
 * of each mean that stands behind it: of the use a car, of the usual number (one error for all weeks), of the mix.
 */
export function branchNeed({ bookedByWeek, open, usual, kinds }: BranchOutlook): BranchNeed {
  const standIns = bookedByWeek.map((booked, week) =>
    usual && open[week] ? Math.max(0, usual.mean - booked) : 0,
  );
  const past = sum(kinds.map((kind) => kind.past));
  const coming: Coming = {
    number: standInNumber(standIns, usual),
    past,
    kinds: kinds.map((kind) => ({ ...kind, share: past > 0 ? kind.past / past : 0 })),
  };
  const products = new Set(kinds.flatMap(({ use }) => [...(use?.keys() ?? [])]));
  return {
    standIns,
    products: new Map([...products].map((product) => [product, productNeed(coming, product)])),
    carsWithoutUse: sum(
      coming.kinds.map(({ use, booked, share }) => (use ? 0 : booked + share * coming.number.mean)),
    ),
  };
}

interface Coming {
  /** All stand-ins of the weeks. */
  number: MeanAndVariance;
  past: number;
  kinds: (NeedKind & { share: number })[];
}

/** How many stand-ins there will be over all weeks. */
function standInNumber(standIns: readonly number[], usual: UsualCars | undefined): MeanAndVariance {
  const mean = sum(standIns);
  if (!usual || mean === 0) return { mean: 0, variance: 0 };
  const filled = standIns.filter((cars) => cars > 0).length;
  const fromWeekToWeek = (usual.variance * mean) / usual.mean;
  const ofTheMean = (filled ** 2 * usual.variance) / usual.weeks;
  return { mean, variance: fromWeekToWeek + ofTheMean };
}

function productNeed({ number, past, kinds }: Coming, product: number): MeanAndVariance {
  const uses = kinds.map(({ use, ...kind }) => ({
    ...kind,
    ...(use?.get(product) ?? { mean: 0, variance: 0, cars: undefined }),
  }));
  const mean = sum(uses.map((use) => use.share * use.mean));
  const within = sum(uses.map((use) => use.share * use.variance));
  const between = sum(uses.map((use) => use.share * (use.mean - mean) ** 2));
  const standIns = compoundSum(number, { mean, variance: within + between });
  const ofUse = sum(
    uses.map((use) =>
      use.cars === undefined
        ? 0
        : ((use.booked + use.share * number.mean) ** 2 * use.variance) / use.cars,
    ),
  );
  const ofMix = past > 0 ? (number.mean ** 2 * between) / past : 0;
  return {
    mean: sum(uses.map((use) => use.booked * use.mean)) + standIns.mean,
    variance: sum(uses.map((use) => use.booked * use.variance)) + standIns.variance + ofUse + ofMix,
  };
}

function sum(values: readonly number[]): number {
  return values.reduce((all, value) => all + value, 0);
}
