import { halfYearLater, halfYearOf } from '#shared/domain/half-year';
import { isRot } from '#shared/domain/recorded-job';
import { CHECKS, STAGES } from '#shared/domain/vocabulary';
import { chartSignals } from '#shared/stats/chart-signals';
import { mannKendall } from '#shared/stats/mann-kendall';
import { theilSenSlope } from '#shared/stats/theil-sen-slope';
import { xmrLimits } from '#shared/stats/xmr-limits';
import { PACKAGES } from './catalogue';
import {
  adjustedRot,
  branchesOf,
  carsOf,
  carsOn,
  claimsPerCar,
  indices,
  leastSquares,
  ratioToNorm,
  rotShare,
  shareNo,
  stageRatio,
  weeklyMargins,
  type Car,
} from './measured-cars';
import {
  againstExpected,
  cohortsAgainstExpected,
  riskOfMissing,
  type AgainstExpected,
} from './measured-claims';
import { badCohortOn, PLANTED_FACTS } from './planted-facts';

const WARRANTY = new Map<string, number>(
  PACKAGES.map((entry) => [entry.code, entry.warrantyMonths]),
);

// The facts must not hang on the day the demo is made: add days here when the generator changes.
describe.each(['2026-02-02'])('the planted facts on %s', (today) => {
  let cars: Car[];
  let branches: Map<string, AgainstExpected>;

  beforeAll(() => {
    cars = carsOn(today);
    branches = againstExpected(cars, today, (car) => car.branch);
  });

  test('the drifting branch, on its weekly chart, runs low or falls outside and trends down', () => {
    const { branch, trendPBelow, slopePerWeekBelow, weeks, signals } = PLANTED_FACTS.driftingBranch;
    const shares = weeklyMargins(cars, branch, today).slice(-52);
    const limits = xmrLimits(shares.slice(-27, -1));
    const seen = chartSignals(shares.slice(-weeks), limits).slice(-8);
    expect(seen.some((signal) => (signals as readonly unknown[]).includes(signal))).toBe(true);
    expect(mannKendall(shares)!.p).toBeLessThan(trendPBelow);
    const last = shares.slice(-weeks);
    expect(theilSenSlope(indices(last), last)!).toBeLessThan(slopePerWeekBelow);
  });

  test('the other branches, over the same half year, do not drift like it', () => {
    for (const branch of branchesOf(cars)) {
      if (branch === PLANTED_FACTS.driftingBranch.branch) continue;
      if (branch === PLANTED_FACTS.goodSmallBranch.branch) continue;
      const last = weeklyMargins(cars, branch, today).slice(-26);
      expect(theilSenSlope(indices(last), last)!).toBeGreaterThan(-0.003);
    }
  });

  test('ordinary branches, over their last year, keep 34 to 43 % with limits 5 to 10 points away in the middle', () => {
    const { driftingBranch, underApplyingBranch, goodSmallBranch } = PLANTED_FACTS;
    const odd: string[] = [driftingBranch, underApplyingBranch, goodSmallBranch].map(
      (fact) => fact.branch,
    );
    const reaches: number[] = [];
    let inside = 0;
    let all = 0;
    for (const branch of branchesOf(cars).filter((code) => !odd.includes(code))) {
      const shares = weeklyMargins(cars, branch, today).slice(-53);
      const limits = xmrLimits(shares.slice(-27, -1))!;
      expect(limits.centre).toBeGreaterThan(0.34);
      expect(limits.centre).toBeLessThan(0.43);
      reaches.push(limits.upper - limits.centre);
      inside += shares.filter((share) => share > limits.lower && share < limits.upper).length;
      all += shares.length;
    }
    expect(inside / all).toBeGreaterThan(0.95);
    const middle = reaches.sort((a, b) => a - b)[Math.floor(reaches.length / 2)]!;
    expect(middle).toBeGreaterThan(0.05);
    expect(middle).toBeLessThan(0.1);
  });

  test('the under-applying branch, against norm and expected claims, sprays too little and pays for it', () => {
    const fact = PLANTED_FACTS.underApplyingBranch;
    expect(ratioToNorm(carsOf(cars, fact.branch))).toBeLessThan(fact.ratioToNormBelow);
    const { claims, expected, lower } = branches.get(fact.branch)!;
    expect(claims / expected).toBeGreaterThan(fact.observedOverExpectedAbove);
    expect(lower).toBeGreaterThan(1);
    for (const branch of branchesOf(cars).filter((code) => code !== fact.branch)) {
      expect(ratioToNorm(carsOf(cars, branch))).toBeGreaterThan(0.9);
    }
  });

  test('the check-skipping branch, against the others, misses it often and has more claims', () => {
    const fact = PLANTED_FACTS.checkSkippingBranch;
    for (const branch of branchesOf(cars)) {
      const share = shareNo(carsOf(cars, branch));
      if (branch === fact.branch) expect(share).toBeGreaterThan(fact.shareNoAbove);
      else expect(share).toBeLessThan(fact.shareNoElsewhereBelow);
    }
    const { claims, expected, lower } = branches.get(fact.branch)!;
    expect(claims / expected).toBeGreaterThan(fact.observedOverExpectedAbove);
    expect(lower).toBeGreaterThan(1);
  });

  test('the skipped check, pooled over age bands, stands out before all others and beyond chance', () => {
    const { check, riskRatioAbove } = PLANTED_FACTS.checkSkippingBranch;
    const risks = new Map(CHECKS.map((one) => [one, riskOfMissing(cars, one, today)]));
    const { riskRatio, lower } = risks.get(check)!;
    expect(riskRatio).toBeGreaterThan(riskRatioAbove);
    expect(lower).toBeGreaterThan(1);
    const ratios = [...risks.values()].map((risk) => risk?.riskRatio ?? 0);
    expect(Math.max(...ratios)).toBe(riskRatio);
  });

  test('no other branch, with its exact interval, stands above what is expected', () => {
    const { underApplyingBranch, checkSkippingBranch } = PLANTED_FACTS;
    const above = [...branches].filter(([, { lower }]) => lower > 1).map(([code]) => code);
    expect(above.sort()).toEqual([checkSkippingBranch.branch, underApplyingBranch.branch]);
  });

  test('the bad cohort, against the half-years beside it and what is expected, has more claims', () => {
    const fact = PLANTED_FACTS.badCohort;
    const bad = badCohortOn(today);
    const cohorts = cohortsAgainstExpected(cars, today);
    const { claims, expected, lower } = cohorts.get(bad)!;
    expect(claims / expected).toBeGreaterThan(fact.observedOverExpectedAbove);
    expect(lower).toBeGreaterThan(1);
    const [before, itself, after] = [-1, 0, 1].map((steps) => {
      const cohort = halfYearLater(bad, steps);
      return claimsPerCar(cars.filter((car) => halfYearOf(car.content.completedOn) === cohort));
    }) as [number, number, number];
    expect(itself).toBeGreaterThan(before * fact.claimsPerCarAboveNeighboursTimes);
    expect(itself).toBeGreaterThan(after * fact.claimsPerCarAboveNeighboursTimes);
    // Half-years with few claims yet are left out: the youngest have lived through one season only.
    const others = [...cohorts].filter(([key, one]) => key !== bad && one.expected >= 50);
    expect(others.length).toBeGreaterThan(4);
    for (const [, other] of others) expect(other.lower).toBeLessThan(1);
  });

  test('the good small branch, with few cars, has no claim where fewer than three were expected', () => {
    const fact = PLANTED_FACTS.goodSmallBranch;
    const own = carsOf(cars, fact.branch);
    expect(own.length).toBeGreaterThan(60);
    expect(own.length).toBeLessThan(fact.carsBelow);
    expect(own.flatMap((car) => car.claims)).toHaveLength(fact.claims);
    // With fewer than 3.69 expected, none at all lies inside the 95 % Poisson limits: exp(−3.69) = 0.025.
    expect(branches.get(fact.branch)!.expected).toBeLessThan(3);
    for (const branch of branchesOf(cars).filter((code) => code !== fact.branch)) {
      expect(carsOf(cars, branch).flatMap((car) => car.claims).length).toBeGreaterThan(0);
    }
  });

  test('the slow stage, at its branch alone, takes nearly twice its estimate', () => {
    const fact = PLANTED_FACTS.slowStageBranch;
    for (const branch of branchesOf(cars)) {
      const ratio = stageRatio(carsOf(cars, branch), fact.stage);
      if (branch === fact.branch) expect(ratio).toBeGreaterThan(fact.ratioAbove);
      else expect(ratio).toBeLessThan(fact.ratioElsewhereBelow);
    }
    const planned = STAGES.filter((stage) => stage !== 'repair');
    const ratios = planned.map((stage) => stageRatio(carsOf(cars, fact.branch), stage));
    expect(planned[ratios.indexOf(Math.max(...ratios))]).toBe(fact.stage);
  });

  test('the salt region, allowed for age, has about double the rot of the others', () => {
    const fact = PLANTED_FACTS.saltRegion;
    const regions = [...new Set(cars.map((car) => car.region))];
    const others = regions.filter((region) => region !== fact.region);
    const elsewhere =
      others.reduce((all, region) => all + adjustedRot(cars, region), 0) / others.length;
    const times = adjustedRot(cars, fact.region) / elsewhere;
    expect(times).toBeGreaterThan(fact.adjustedTimesAbove);
    expect(times).toBeLessThan(fact.adjustedTimesBelow);
  });

  test('rot by age, over the network, is about 3 % under five years and over half from fifteen', () => {
    const share = (band: string) => rotShare(cars.filter((car) => car.figures.ageBand === band));
    expect(share('0-4')).toBeGreaterThan(0.02);
    expect(share('0-4')).toBeLessThan(0.05);
    expect(share('15-19')).toBeGreaterThan(0.5);
    expect(share('20+')).toBeGreaterThan(share('15-19'));
  });

  test('the worst zone, in every region, is met in most cars', () => {
    for (const region of new Set(cars.map((car) => car.region))) {
      const zones = new Map<string, number>();
      for (const car of cars.filter((one) => one.region === region)) {
        for (const zone of new Set((car.content.findings ?? []).filter(isRot).map((f) => f.zone))) {
          zones.set(zone, (zones.get(zone) ?? 0) + 1);
        }
      }
      const [first] = [...zones].sort((a, b) => b[1] - a[1]);
      expect(first![0]).toBe(PLANTED_FACTS.worstZone.zone);
    }
  });

  test('the worst model, among those with 300 cars of its age, is most often rotten', () => {
    const { make, model, ageBand } = PLANTED_FACTS.worstModel;
    const groups = new Map<string, Car[]>();
    for (const car of cars.filter((one) => one.figures.ageBand === ageBand)) {
      const name = `${car.content.vehicle.make} ${car.content.vehicle.model}`;
      const group = groups.get(name) ?? [];
      group.push(car);
      groups.set(name, group);
    }
    const ranked = [...groups]
      .filter(([, group]) => group.length >= 300)
      .sort((a, b) => rotShare(b[1]) - rotShare(a[1]));
    expect(ranked.length).toBeGreaterThan(5);
    expect(ranked[0]![0]).toBe(`${make} ${model}`);
  });

  test('cavity wax, on full hatchbacks and overall, is used more in the cold', () => {
    const fact = PLANTED_FACTS.coldWax;
    for (const group of [
      cars,
      cars.filter((car) => car.content.vehicle.bodyType === 'hatchback'),
    ]) {
      const slope = leastSquares(
        group.flatMap((car) => {
          const ml = car.figures.products.get(fact.product)?.ml;
          const at = car.content.workshop?.temperatureC;
          return ml && at !== undefined ? [[at, ml] as const] : [];
        }),
      );
      expect(slope).toBeLessThan(fact.slopeMlPerDegreeBelow);
      expect(slope).toBeGreaterThan(fact.slopeMlPerDegreeAbove);
    }
  });

  test('claims, over cars whose 36 months have run, come from 2 to 4 in a hundred', () => {
    const run = cars.filter(
      (car) => WARRANTY.get(car.content.package) === 36 && car.warrantyEnd < today,
    );
    expect(run.length).toBeGreaterThan(10_000);
    expect(claimsPerCar(run)).toBeGreaterThan(0.02);
    expect(claimsPerCar(run)).toBeLessThan(0.04);
  });

  test('no cost is missing for any job', () => {
    expect(cars.filter((car) => car.figures.missing.length > 0)).toEqual([]);
  });
});
