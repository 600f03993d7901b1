import type { RotAnswer } from '#shared/contracts/rot';
import type { SentJob } from '#shared/domain/normalise-job';
import { fitBetaBinomial, shrunkShare } from '#shared/stats/beta-binomial';
import { directlyStandardised } from '#shared/stats/direct-standardisation';
import { wilsonInterval } from '#shared/stats/wilson-interval';

/** A job as it was sent, and where; `order` tells which of two came in later. */
export interface CarSent {
  branch: string;
  region: string;
  ref: string;
  job: SentJob;
  order: number;
}

/** What is asked of a recount: the scope of the answer, and what its caller may see in all. */
export interface RecountAsked {
  scope: { regions: string[]; branches: string[] };
  reach: 'network' | readonly string[];
}

type Finding = NonNullable<SentJob['findings']>[number];
const BANDS = ['0-4', '5-9', '10-14', '15-19', '20+'] as const;
/** Written out once more, apart from the product's own table. */
const MIDDLE = ['front_subframe', 'rear_subframe', 'boot_floor', 'slam_panel', 'tailgate'];
const ZONES = [
  ...(['front_wing', 'front_arch', 'bulkhead_drain', 'sill_outer', 'sill_inner'] as const),
  ...(['floor', 'jacking_point', 'chassis_rail', 'front_subframe', 'rear_arch'] as const),
  ...(['rear_subframe', 'boot_floor', 'door_bottom', 'slam_panel', 'tailgate'] as const),
];
const CLIMATES: Record<string, object> = {
  COAST: { corrosionRateUmPerYear: null, corrosivityCategory: null, outsideFittedRange: false },
};

/**
 * The answer on rot counted afresh, car by car and finding by finding, from the jobs of the whole network that fit period and
 * filters: a second opinion that shares no counting with the product. Methods of statistics are the product's, held to
 * published values elsewhere. What a region's air does is left to the caller unless it has no climate.
 */
export function recountRot(
  network: readonly CarSent[],
  { scope, reach }: RecountAsked,
): Omit<RotAnswer, 'period'> {
  const own = network.filter(({ branch }) => scope.branches.includes(branch));
  const strangers = (cars: readonly CarSent[]): number =>
    new Set(cars.filter(({ branch }) => !reach.includes(branch)).map(({ branch }) => branch)).size;
  const mayKnow = (cars: readonly CarSent[]): boolean =>
    reach === 'network' || strangers(cars) >= 5;
  const reference = mayKnow(network) ? 'network' : 'scope';
  // What the caller sees, whatever rows were chosen.
  const seen = network.filter(({ branch }) => reach === 'network' || reach.includes(branch));
  const standard = reference === 'network' ? network : seen;
  const bandsOf = (cars: readonly CarSent[]) => BANDS.filter((band) => inBand(cars, band).length);
  return {
    scope,
    jobs: own.length,
    reference,
    overall: counted(own),
    bands: bandsOf(own).map((ageBand) => {
      const behind = inBand(standard, ageBand);
      const told = reference === 'scope' || mayKnow(behind);
      return {
        ageBand,
        ...counted(inBand(own, ageBand)),
        referenceShare: told ? counted(behind).share : null,
      };
    }),
    cells: bandsOf(own).flatMap((ageBand) =>
      scope.regions.flatMap((region) => {
        const cars = inBand(ofRegion(own, region), ageBand);
        return cars.length > 0 ? [{ ageBand, region, ...counted(cars) }] : [];
      }),
    ),
    regions: scope.regions.map((region) => {
      const cars = ofRegion(own, region);
      const { lower: _l, upper: _u, ...plain } = counted(cars);
      return {
        region,
        ...plain,
        ...adjusted(cars, standard),
        ...(CLIMATES[region] ?? ANY_CLIMATE),
      } as RotAnswer['regions'][number];
    }),
    zones: ZONES.flatMap((zone) =>
      bandsOf(own).map((ageBand) => zoneOf(zone, ageBand, inBand(own, ageBand))),
    ),
    models: modelsOf(own),
    openedUp: openedUp(own),
  };
}

const ANY_CLIMATE = {
  corrosionRateUmPerYear: expect.any(Number) as number,
  corrosivityCategory: expect.any(String) as 'C1',
  outsideFittedRange: expect.any(Boolean) as boolean,
};

function ageBand({ job }: CarSent): (typeof BANDS)[number] {
  const monthsOf = (text: string) => Number(text.slice(0, 4)) * 12 + Number(text.slice(5, 7));
  const months = monthsOf(job.completedOn) - monthsOf(job.vehicle.firstRegistered);
  return BANDS[Math.min(4, Math.floor(Math.floor(months / 12) / 5))]!;
}

function inBand(cars: readonly CarSent[], band: string): CarSent[] {
  return cars.filter((car) => ageBand(car) === band);
}

function ofRegion(cars: readonly CarSent[], region: string): CarSent[] {
  return cars.filter((car) => car.region === region);
}

function isRotten(finding: Finding): boolean {
  const { seenAs, workedAs } = finding;
  return seenAs !== 'surface' || workedAs === 'bubbling' || workedAs === 'holed';
}

function rotOf(cars: readonly CarSent[], where: (finding: Finding) => boolean = () => true) {
  return cars.filter(({ job }) => (job.findings ?? []).some((one) => isRotten(one) && where(one)));
}

function interval(part: number, all: number) {
  if (all < 5) return { share: null, lower: null, upper: null };
  const { estimate, lower, upper } = wilsonInterval(part, all)!;
  return { share: estimate, lower, upper };
}

function counted(cars: readonly CarSent[], rotten = rotOf(cars)) {
  const withRot = rotten.length;
  return { cars: cars.length, withRot, ...interval(withRot, cars.length) };
}

function adjusted(cars: readonly CarSent[], standard: readonly CarSent[]) {
  const kept = BANDS.filter((band) => inBand(cars, band).length > 0);
  const bandsLeftOut = BANDS.filter(
    (band) => !kept.includes(band) && inBand(standard, band).length > 0,
  );
  if (cars.length < 5) {
    return { adjustedShare: null, adjustedLower: null, adjustedUpper: null, bandsLeftOut };
  }
  const weights = kept.map((band) => inBand(standard, band).length);
  const whole = weights.reduce((sum, weight) => sum + weight, 0);
  const share = kept.reduce((sum, band, at) => {
    const group = inBand(cars, band);
    return sum + ((weights[at]! / whole) * rotOf(group).length) / group.length;
  }, 0);
  const limits = directlyStandardised(
    kept.map((band) => rotOf(inBand(cars, band)).length),
    kept.map((band) => inBand(cars, band).length),
    weights,
  )!;
  return {
    adjustedShare: expect.closeTo(share, 12) as number,
    adjustedLower: limits.lower,
    adjustedUpper: Math.min(1, limits.upper),
    bandsLeftOut,
  };
}

function zoneOf(zone: (typeof ZONES)[number], band: (typeof BANDS)[number], cars: CarSent[]) {
  const natural = MIDDLE.includes(zone) ? ['centre'] : ['left', 'right'];
  const sides = (['left', 'right', 'centre'] as const).flatMap((side) => {
    const withRot = rotOf(cars, (one) => one.zone === zone && one.side === side).length;
    const told = natural.includes(side) || withRot > 0;
    return told ? [{ side, withRot, ...interval(withRot, cars.length) }] : [];
  });
  const rotten = rotOf(cars, (one) => one.zone === zone);
  return { zone, ageBand: band, ...counted(cars, rotten), sides };
}

function modelsOf(cars: readonly CarSent[]): RotAnswer['models'] {
  const keyOf = ({ job }: CarSent) => `${job.vehicle.make}|${job.vehicle.model}`.toLowerCase();
  const keys = [...new Set(cars.map(keyOf))];
  const rows = keys.flatMap((key) => {
    const group = cars.filter((car) => keyOf(car) === key);
    const newest = group.reduce((last, car) =>
      car.job.completedOn > last.job.completedOn ||
      (car.job.completedOn === last.job.completedOn && car.order > last.order)
        ? car
        : last,
    );
    const { make, model } = newest.job.vehicle;
    return BANDS.flatMap((band) => {
      const own = inBand(group, band);
      if (own.length === 0) return [];
      const all = keys.map((other) =>
        inBand(
          cars.filter((car) => keyOf(car) === other),
          band,
        ),
      );
      const successes = all.map((one) => rotOf(one).length);
      const sizes = all.map((one) => one.length);
      const fit = fitBetaBinomial(successes, sizes);
      const pool = wilsonInterval(rotOf(all.flat()).length, all.flat().length)!;
      const { share, lower, upper } = fit
        ? shrunkShare(fit, rotOf(own).length, own.length)
        : { share: pool.estimate, lower: pool.lower, upper: pool.upper };
      const { lower: _l, upper: _u, ...plain } = counted(own);
      const steadied = { shrunkShare: near(share), lower: near(lower), upper: near(upper) };
      return [{ make, model, ageBand: band, ...plain, ...steadied, pooled: !fit }];
    });
  });
  const place = ({ make, model, ageBand: band }: RotAnswer['models'][number]) =>
    `${make}\n${model}\n${BANDS.indexOf(band)}`;
  return rows.sort((a, b) => (place(a) < place(b) ? -1 : 1));
}

/** The order of the groups may move the last digits of a likelihood's maximum. */
function near(value: number): number {
  return expect.closeTo(value, 6) as number;
}

function openedUp(cars: readonly CarSent[]): RotAnswer['openedUp'] {
  const worked = cars
    .flatMap(({ job }) => job.findings ?? [])
    .filter(({ seenAs, workedAs }) => seenAs === 'bubbling' && workedAs !== undefined);
  const holed = worked.filter(({ workedAs }) => workedAs === 'holed').length;
  return { worked: worked.length, holed, ...interval(holed, worked.length) };
}
