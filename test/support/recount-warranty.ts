import type { CurveGroup, WarrantyAnswer } from '#shared/contracts/warranty';
import { chainLadder } from '#shared/stats/chain-ladder';
import { logRank } from '#shared/stats/log-rank';
import { pooledRiskRatio } from '#shared/stats/mantel-haenszel';
import { poissonInterval } from '#shared/stats/poisson-interval';
import {
  againstExpected,
  BANDS,
  bandOf,
  countedOf,
  daysRun,
  endOf,
  firstClaim,
  halfYear,
  isCovered,
  isRefused,
  lastEnd,
  monthOf,
  monthsOf,
  plus,
  ratesOf,
  triangleOf,
  type SoldCar,
} from './recount-cover';
import type { SentClaim } from './warranty-store';

/** What is asked of a recount; cars are those that fit the filters, of the whole network. */
export interface WarrantyAsked {
  scope: { regions: string[]; branches: string[] };
  reach: 'network' | readonly string[];
  asOf: string;
  from?: string | undefined;
  to?: string | undefined;
  groupBy: CurveGroup;
  groups?: readonly string[] | undefined;
}

const CHECKS = [
  ...(['linersOff', 'bothDirections', 'brakesCovered', 'driedOut', 'drainsClear'] as const),
  'primerCured' as const,
];
const CAUSES = ['missed_area', 'thin_coverage', 'damage', 'drain_blocked', 'not_covered'] as const;
const ZONES = [
  ...(['front_wing', 'front_arch', 'bulkhead_drain', 'sill_outer', 'sill_inner'] as const),
  ...(['floor', 'jacking_point', 'chassis_rail', 'front_subframe', 'rear_arch'] as const),
  ...(['rear_subframe', 'boot_floor', 'door_bottom', 'slam_panel', 'tailgate'] as const),
];
/**
 * The answer on warranty counted afresh from cars and claims as they were sent, day by day and month by month: a second opinion
 * that shares no counting with the product. Methods of statistics are the product's, held to published values elsewhere.
 */
export function recountWarranty(network: readonly SoldCar[], asked: WarrantyAsked): WarrantyAnswer {
  const { scope, reach, asOf, groupBy } = asked;
  const sold = network.filter(({ job }) => job.completedOn <= asOf);
  const own = sold.filter(({ branch }) => scope.branches.includes(branch));
  const covered = own.filter(isCovered);
  const mayKnow = (cars: readonly SoldCar[]): boolean =>
    reach === 'network' ||
    new Set(cars.map((car) => car.branch).filter((b) => !reach.includes(b))).size >= 5;
  const reference = mayKnow(sold.filter(isCovered)) ? 'network' : 'scope';
  const standard = sold.filter(
    ({ branch }) => reference === 'network' || (reach as readonly string[]).includes(branch),
  );
  const against = (cars: readonly SoldCar[]) => againstExpected(cars, standard, asOf);
  const evaluatedOn = lastEnd(asOf);
  const paid = triangleOf(own, evaluatedOn);
  const ladder = chainLadder(paid.rows);
  const cohorts = paid.cohorts.map((cohort, row) => {
    const cars = own.filter(({ job }) => halfYear(job.completedOn) === cohort);
    const { latest, outstanding, standardError } = ladder!.origins[row]!;
    return {
      ...{ cohort, cars: cars.length, latestCents: latest },
      ...{ ultimateCents: latest + cents(outstanding), outstandingCents: cents(outstanding) },
      standardErrorCents: standardError === undefined ? null : cents(standardError),
      ...against(cars),
    };
  });
  const keys = [...new Set(covered.map((car) => keyOf(car, groupBy)))].sort((a, b) =>
    groupBy === 'ageBand' ? place(a) - place(b) : a < b ? -1 : 1,
  );
  const every = keys.map((key) => {
    const cars = covered.filter((car) => keyOf(car, groupBy) === key);
    return { key, cars: cars.length, members: cars };
  });
  const most = [...every].sort(
    (a, b) => b.cars - a.cars || keys.indexOf(a.key) - keys.indexOf(b.key),
  );
  const chosen = asked.groups ?? most.slice(0, 4).map(({ key }) => key);
  const shown = every.filter(({ key }) => chosen.includes(key));
  const days = own.map((car) => car.job.completedOn).sort();
  const to = asked.to ?? asOf;
  const sum = (figure: 'latestCents' | 'ultimateCents' | 'outstandingCents') =>
    cohorts.reduce((all, cohort) => all + cohort[figure], 0);
  const every24 = covered.filter(
    (car) => monthsOf(car) >= 24 && plus(car.job.completedOn, 24) <= asOf,
  );
  const all = own.flatMap((car) => car.claims.map((claim) => ({ car, claim })));
  const made = all.filter(({ claim }) => claim.madeOn <= asOf);
  const counted = countedOf(own, asOf);
  return {
    period: { from: asked.from ?? days[0] ?? (to < asOf ? to : asOf), to },
    scope,
    jobs: own.length,
    reference,
    asOf,
    evaluatedOn,
    covered: covered.length,
    rate: rateOf(counted.length, daysRun(covered, asOf)),
    claimFree: monthsOfCurve(covered, asOf),
    groupBy,
    groups: shown.map(({ key, cars, members }) => ({
      ...{ key, cars, claims: members.filter((car) => firstClaim(car, asOf)).length },
      months: monthsOfCurve(members, asOf),
    })),
    everyGroup: every.map(({ key, cars }) => ({ key, cars })),
    logRank: logRankOf(shown, asOf),
    cohorts,
    total: {
      latestCents: sum('latestCents'),
      ultimateCents: sum('ultimateCents'),
      outstandingCents: sum('outstandingCents'),
      standardErrorCents:
        ladder?.total.standardError === undefined ? null : cents(ladder.total.standardError),
    },
    triangle: {
      rows: paid.cohorts.map((cohort, row) => ({ cohort, cumulativeCents: paid.rows[row]! })),
      factors: (ladder?.factors ?? []).map((one, development) => ({
        ...{ development, fromCents: one.from, toCents: one.to, factor: one.factor },
        sigmaSquared: one.sigmaSquared ?? null,
      })),
    },
    branches: scope.branches.flatMap((branch) => {
      const cars = covered.filter((car) => car.branch === branch);
      if (cars.length === 0) return [];
      const carYears = daysRun(cars, asOf) / 365.25;
      return [{ branch, cars: cars.length, carYears, ...against(cars) }];
    }),
    expectedRates: ratesOf(covered, standard, asOf).map(({ behind, ...rate }) => {
      const told = reference === 'scope' || mayKnow(behind);
      return told ? rate : { ...rate, claims: null, carYears: null };
    }),
    process: CHECKS.map((check) => ({
      check,
      ...pooled(every24, asOf, ({ job }) => answered(job.checks?.[check])),
    })),
    thinProduct: pooled(every24, asOf, thin),
    causes: CAUSES.map((cause) => ({
      cause,
      ...cost(counted.filter((one) => one.cause === cause)),
    })),
    zones: ZONES.map((zone) => ({ zone, ...cost(counted.filter((one) => one.zone === zone)) })),
    left: {
      carsWithoutWarranty: own.length - covered.length,
      claimsAfterEnd: made.filter(
        ({ car, claim }) =>
          !isRefused(claim, asOf) && (!isCovered(car) || claim.madeOn > endOf(car)),
      ).length,
      claimsRefused: made.filter(({ claim }) => isRefused(claim, asOf)).length,
      claimsWaiting: made.filter(({ claim }) => claim.proposed).length,
      paidAfterEvaluationCents: made.reduce(
        (sum_, { claim: { paidOn, costCents } }) =>
          sum_ + (paidOn && paidOn > evaluatedOn && paidOn <= asOf ? (costCents ?? 0) : 0),
        0,
      ),
    },
  };
}

function place(band: string): number {
  return (BANDS as readonly string[]).indexOf(band);
}

function keyOf(car: SoldCar, by: CurveGroup): string {
  const keys = {
    package: car.job.package,
    region: car.region,
    branch: car.branch,
    ageBand: bandOf(car),
    cohort: halfYear(car.job.completedOn),
  };
  return keys[by];
}

function rateOf(claims: number, days: number) {
  const carYears = days / 365.25;
  if (days === 0) return { claims, carYears, per1000: null, lower: null, upper: null };
  const { lower, upper } = poissonInterval(claims);
  const [per1000, low, high] = [claims, lower, upper].map((n) => (n / carYears) * 1000);
  return { claims, carYears, per1000: per1000!, lower: low!, upper: high! };
}

function stepsOf(cars: readonly SoldCar[], asOf: string) {
  const seen = cars.map((car) => {
    const until = endOf(car) < asOf ? endOf(car) : asOf;
    const first = firstClaim(car, asOf);
    return { time: first ?? monthOf(car, until), event: first !== undefined };
  });
  const last = Math.max(0, ...seen.map(({ time }) => time));
  return Array.from({ length: last }, (_, index) => ({
    atRisk: seen.filter(({ time }) => time >= index + 1).length,
    events: seen.filter(({ time, event }) => event && time === index + 1).length,
  }));
}

function monthsOfCurve(cars: readonly SoldCar[], asOf: string): WarrantyAnswer['claimFree'] {
  let share = 1;
  let spread = 0;
  return stepsOf(cars, asOf).map(({ atRisk, events }, index) => {
    share *= 1 - events / atRisk;
    spread += events / (atRisk * (atRisk - events));
    const row = { month: index + 1, atRisk, claims: events };
    if (atRisk < 5) return { ...row, share: null, lower: null, upper: null };
    if (share === 1 || share === 0) return { ...row, share, lower: null, upper: null };
    const reach = (1.959963984540054 * Math.sqrt(spread)) / Math.abs(Math.log(share));
    return { ...row, share, lower: share ** Math.exp(reach), upper: share ** Math.exp(-reach) };
  });
}

function logRankOf(
  shown: readonly { key: string; members: readonly SoldCar[] }[],
  asOf: string,
): WarrantyAnswer['logRank'] {
  const test = logRank(shown.map(({ members }) => stepsOf(members, asOf)));
  if (!test) return null;
  const groups = test.groups.map((sums, index) => ({ key: shown[index]!.key, ...sums }));
  return { ...test, groups };
}

function answered(answer: string | undefined): boolean | undefined {
  return answer === 'no' ? true : answer === 'yes' ? false : undefined;
}

/** Only a full van has a norm: 4 l of one product. */
function thin({ job }: SoldCar): boolean | undefined {
  if (job.package !== 'full' || job.vehicle.bodyType !== 'van') return undefined;
  const ml = (job.products ?? []).filter(({ product }) => product === 'CW1');
  return ml.reduce((sum, line) => sum + line.ml, 0) < 2800;
}

function pooled(
  cars: readonly SoldCar[],
  asOf: string,
  isExposed: (car: SoldCar) => boolean | undefined,
): WarrantyAnswer['thinProduct'] {
  const isCase = (car: SoldCar) => (firstClaim(car, asOf) ?? 99) <= 24;
  const tables = BANDS.flatMap((ageBand) => {
    const ofBand = cars.filter((car) => bandOf(car) === ageBand);
    const [yes, no] = [true, false].map((is) => ofBand.filter((car) => isExposed(car) === is));
    if (yes!.length + no!.length === 0) return [];
    return {
      ...{ ageBand, exposedCars: yes!.length, exposedClaims: yes!.filter(isCase).length },
      ...{ unexposedCars: no!.length, unexposedClaims: no!.filter(isCase).length },
    };
  });
  const both = tables.filter((one) => one.exposedCars > 0 && one.unexposedCars > 0);
  const all = both.reduce((sum, one) => sum + one.exposedCars + one.unexposedCars, 0);
  const risk = pooledRiskRatio(
    both.map((one) => ({
      ...{ exposedCases: one.exposedClaims, exposedTotal: one.exposedCars },
      ...{ unexposedCases: one.unexposedClaims, unexposedTotal: one.unexposedCars },
    })),
  );
  const told = risk && all >= 5 ? risk : { riskRatio: null, lower: null, upper: null };
  return { ...told, strata: both.length, tables };
}

function cost(claims: readonly SentClaim[]): { claims: number; costCents: number } {
  const costCents = claims.reduce((sum, { costCents: one = 0 }) => sum + one, 0);
  return { claims: claims.length, costCents };
}

function cents(amount: number): number {
  return Math.round(amount);
}
