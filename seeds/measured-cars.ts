import { addMonths, isoWeek } from '#shared/domain/calendar';
import { deriveFigures, marginCents, type JobFigures } from '#shared/domain/job-figures';
import { normaliseJob } from '#shared/domain/normalise-job';
import { AGE_BANDS, type Stage } from '#shared/domain/vocabulary';
import type { RecordedJob } from '#shared/domain/recorded-job';
import type { JobContent } from '#shared/contracts/jobs';
import { normOf, PACKAGES } from './catalogue';
import { costBookOf } from './demo-costs';
import { newestContent, type DemoClaim, type PackageCode } from './demo-network';
import { DEMO_SEED, generateNetwork } from './generate-network';
import { PLANTED_FACTS } from './planted-facts';

/** A car of the demo with what follows from its job: for recounting the planted facts without a database. */
export interface Car {
  branch: string;
  region: string;
  content: JobContent;
  figures: JobFigures;
  /** Claims that count (rule 14). */
  claims: DemoClaim[];
  warrantyEnd: string;
}

const WARRANTY = new Map<string, number>(
  PACKAGES.map((entry) => [entry.code, entry.warrantyMonths]),
);

/** Every car of the demo network seen from a day, with its derived figures and the claims that count. */
export function carsOn(today: string): Car[] {
  const network = generateNetwork({ seed: DEMO_SEED, today });
  const costs = costBookOf(network.setUp);
  const regions = new Map(network.setUp.branches.map((branch) => [branch.code, branch.region]));
  const cars: Car[] = [];
  for (const history of network.histories()) {
    const byRef = new Map<string, Car>();
    for (const job of history.jobs.filter((one) => !one.voided)) {
      const content = newestContent(job);
      const car: Car = {
        branch: history.branchCode,
        region: regions.get(history.branchCode)!,
        content,
        figures: deriveFigures(recordedFrom(content), history.branchCode, costs),
        claims: [],
        warrantyEnd: addMonths(content.completedOn, WARRANTY.get(content.package)!),
      };
      cars.push(car);
      byRef.set(job.jobRef, car);
    }
    for (const claim of history.claims) {
      const car = byRef.get(claim.content.jobRef)!;
      if (claim.content.decision !== 'refused' && claim.content.madeOn <= car.warrantyEnd) {
        car.claims.push(claim);
      }
    }
  }
  return cars;
}

/** A job of the demo in the form in which the record keeps it. */
export function recordedFrom(content: JobContent): RecordedJob {
  const total = content.invoice?.totalCents;
  const invoice = total === undefined ? undefined : { ...content.invoice, totalCents: total };
  return normaliseJob({ ...content, invoice });
}

/** The cars of a branch. */
export function carsOf(cars: Car[], branch: string): Car[] {
  return cars.filter((car) => car.branch === branch);
}

/** Codes of the branches that have cars. */
export function branchesOf(cars: Car[]): string[] {
  return [...new Set(cars.map((car) => car.branch))];
}

/** Margin shares of the billed weeks that are over, oldest first (rules 4 and 7). */
export function weeklyMargins(cars: Car[], branch: string, today: string): number[] {
  const weeks = new Map<string, { margin: number; revenue: number }>();
  for (const { figures } of carsOf(cars, branch)) {
    if (!figures.billed || !figures.money || figures.week === isoWeek(today)) continue;
    const week = weeks.get(figures.week) ?? { margin: 0, revenue: 0 };
    week.margin += marginCents(figures.money);
    week.revenue += figures.money.revenueCents;
    weeks.set(figures.week, week);
  }
  return [...weeks]
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([, week]) => week.margin / week.revenue);
}

/** 0, 1, 2 … for as many values. */
export function indices(values: number[]): number[] {
  return values.map((_, index) => index);
}

/** Σ ml over Σ norm ml (rules 37 and 39). */
export function ratioToNorm(cars: Car[]): number {
  let ml = 0;
  let norm = 0;
  for (const { content, figures } of cars) {
    for (const line of normOf(content.package as PackageCode, content.vehicle.bodyType)) {
      norm += line.ml;
      ml += figures.products.get(line.product)?.ml ?? 0;
    }
  }
  return ml / norm;
}
/** Share of `no` among the answers yes and no to the check that one branch skips. */
export function shareNo(cars: Car[]): number {
  const answers = cars.map((car) => car.content.checks?.[PLANTED_FACTS.checkSkippingBranch.check]);
  const no = answers.filter((answer) => answer === 'no').length;
  return no / (no + answers.filter((answer) => answer === 'yes').length);
}

/** Σ actual over Σ estimated minutes of a stage, over cars with an estimate. */
export function stageRatio(cars: Car[], stage: Stage): number {
  let estimated = 0;
  let actual = 0;
  for (const { figures } of cars.filter((car) => car.figures.hasEstimate)) {
    estimated += figures.estimated[stage];
    actual += figures.actual[stage];
  }
  return actual / estimated;
}

/** Share of cars with rot. */
export function rotShare(cars: Car[]): number {
  return cars.filter((car) => car.figures.hasRot).length / cars.length;
}

/** Direct standardisation to the network's age mix. */
export function adjustedRot(cars: Car[], region: string): number {
  return AGE_BANDS.reduce((all, band) => {
    const inBand = cars.filter((car) => car.figures.ageBand === band);
    const here = inBand.filter((car) => car.region === region);
    return all + (inBand.length / cars.length) * rotShare(here);
  }, 0);
}

/** Counted claims a car. */
export function claimsPerCar(cars: Car[]): number {
  return cars.reduce((all, car) => all + car.claims.length, 0) / cars.length;
}

/** Slope of the least-squares line, x centred first. */
export function leastSquares(points: (readonly [number, number])[]): number {
  const n = points.length;
  const meanX = points.reduce((all, [x]) => all + x, 0) / n;
  const meanY = points.reduce((all, [, y]) => all + y, 0) / n;
  const xy = points.reduce((all, [x, y]) => all + (x - meanX) * (y - meanY), 0);
  return xy / points.reduce((all, [x]) => all + (x - meanX) ** 2, 0);
}
