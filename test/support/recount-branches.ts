import type { BranchesAnswer } from '#shared/contracts/branches';
import { CLAIM_CAUSES, STAGES, type BranchMeasure } from '#shared/domain/vocabulary';
import { binomialLimits, poissonLimits, type FunnelLimits } from '#shared/stats/funnel-limits';
import { bandOf, BANDS, countedOf, daysRun, isCovered, type SoldCar } from './recount-cover';

/** What is asked of a recount: the scope of the answer, what its caller may see in all, and the day it is counted on. */
export interface FunnelRecountAsked {
  measure: BranchMeasure;
  scope: readonly string[];
  reach: 'network' | readonly string[];
  today: string;
}

/** One car as a measure sees it: what is divided by what, and the parts of the former. */
interface Counted {
  branch: string;
  cell: string;
  e: number;
  parts: Record<string, number>;
}

/** Millilitres of a norm, by package and body type: what the tests' network is set up with. */
export const RECOUNTED_NORMS: Record<string, Record<string, number>> = {
  'full/van': { CW1: 4000 },
  'cavity/suv': { CW1: 1500, UW1: 2500 },
};
/** Branches whose hour has a cost, of 36.00. */
const COSTED = ['AAA', 'BBB', 'CCC'];

/**
 * Branches in their funnel counted afresh, car by car, from what was sent: a second opinion that shares no counting with the
 * product. Limits of counts are the product's, held to published values elsewhere.
 */
export function recountBranches(
  network: readonly SoldCar[],
  { measure, scope, reach, today }: FunnelRecountAsked,
): Pick<BranchesAnswer, 'reference' | 'network' | 'referenceCars' | 'branches'> & {
  steps: Map<string, Map<string, number> | null>;
} {
  const all = network.flatMap((car) => countedAs(measure, car, today) ?? []);
  const isMine = (branch: string) => reach === 'network' || reach.includes(branch);
  const strangers = new Set(all.flatMap(({ branch }) => (isMine(branch) ? [] : branch))).size;
  const ofNetwork = reach === 'network' || strangers >= 5;
  const standard = ofNetwork ? all : all.filter(({ branch }) => isMine(branch));
  const whole = ratio(standard);
  const spread = variance(standard);
  const steps = new Map<string, Map<string, number> | null>();
  const branches = scope.flatMap((branch) => {
    const own = all.filter((car) => car.branch === branch);
    if (own.length === 0) return [];
    const e = sum(own.map((car) => car.e));
    const enough = own.length >= 5 && e > 0;
    const told = e > 0 && (enough || measure === 'margin' || measure === 'claims');
    const value = told ? ratio(own) : null;
    const rateOf = (car: Counted) => ratio(standard.filter(({ cell }) => cell === car.cell)) ?? 0;
    const expected = enough ? sum(own.map((car) => rateOf(car) * car.e)) / e : null;
    const limits =
      expected === null ? undefined : limitsOf(measure, expected, own.length, e, spread);
    steps.set(branch, expected === null ? null : stepsOf(own, standard, e, expected - whole!));
    const claims = sum(own.map(divided));
    return {
      ...{ branch, region: regionOf(network, branch), cars: own.length },
      ...{ value: near(value), expected: near(expected) },
      lower95: near(limits?.lower95, 6),
      upper95: near(limits?.upper95, 6),
      lower998: near(limits?.lower998, 6),
      upper998: near(limits?.upper998, 6),
      flag: flagOf(value, limits),
      denominator: near(measure === 'claims' ? e * 1000 : e)!,
      claims: measure === 'claims' ? claims : null,
      expectedClaims: measure === 'claims' && expected !== null ? near(expected * e) : null,
      target: null,
    };
  });
  return {
    reference: ofNetwork ? 'network' : 'scope',
    network: near(whole),
    referenceCars: standard.length,
    branches,
    steps,
  };
}

function countedAs(measure: BranchMeasure, car: SoldCar, today: string): Counted | undefined {
  const { branch, job } = car;
  const cell = `${job.package}/${bandOf(car)}`;
  const told = (e: number, parts: Record<string, number>): Counted => ({ branch, cell, e, parts });
  switch (measure) {
    case 'overrun': {
      const e = sum(Object.values(job.estimate?.stages ?? {}));
      return e > 0 ? told(e, { ...job.actual.stages }) : undefined;
    }
    case 'rot': {
      const isRotten = (job.findings ?? []).some(
        ({ seenAs, workedAs }) =>
          seenAs !== 'surface' || (workedAs !== undefined && workedAs !== 'surface'),
      );
      return told(1, { [bandOf(car)]: isRotten ? 1 : 0 });
    }
    case 'claims': {
      if (!isCovered(car) || job.completedOn > today) return undefined;
      const parts: Record<string, number> = {};
      for (const { cause } of countedOf([car], today)) parts[cause] = (parts[cause] ?? 0) + 1;
      return told(daysRun([car], today) / 365.25 / 1000, parts);
    }
    case 'product': {
      const norm = RECOUNTED_NORMS[`${job.package}/${job.vehicle.bodyType}`];
      if (!norm) return undefined;
      const parts: Record<string, number> = {};
      for (const { product, ml } of job.products ?? []) {
        if (product in norm) parts[product] = (parts[product] ?? 0) + ml;
      }
      return told(sum(Object.values(norm)), parts);
    }
    case 'margin':
      return marginOf(car, told);
  }
}

/** An hour costs 36.00, a litre of CW1 12.00, UW1 nothing known, the fee is a twentieth; every line rounded half up. */
function marginOf(
  { branch, job }: SoldCar,
  told: (e: number, parts: Record<string, number>) => Counted,
): Counted | undefined {
  const total = job.invoice?.totalCents;
  if (total === undefined || !COSTED.includes(branch)) return undefined;
  if ((job.products ?? []).some(({ product }) => product === 'UW1')) return undefined;
  const { repair = 0, ...others } = job.actual.stages;
  return told(total, {
    revenue: total,
    plannedLabour: -60 * sum(Object.values(others)),
    rotLabour: -60 * repair,
    product: -sum((job.products ?? []).map(({ ml }) => Math.floor(ml * 1.2 + 0.5))),
    consumables: -(job.boughtInCents ?? 0),
    fee: -Math.floor(total / 20 + 0.5),
  });
}

function stepsOf(
  own: readonly Counted[],
  standard: readonly Counted[],
  e: number,
  mix: number,
): Map<string, number> {
  const keys = [...new Set(standard.flatMap(({ parts }) => Object.keys(parts)))];
  const part = (cars: readonly Counted[], key: string) =>
    sum(cars.map(({ parts }) => parts[key] ?? 0));
  return new Map([
    ['mix', mix],
    ...keys.map((key): [string, number] => {
      const given = own.map((car) => {
        const alike = standard.filter(({ cell }) => cell === car.cell);
        const whole = sum(alike.map((one) => one.e));
        return whole > 0 ? (part(alike, key) / whole) * car.e : 0;
      });
      return [key, (part(own, key) - sum(given)) / e];
    }),
  ]);
}

function limitsOf(
  measure: BranchMeasure,
  expected: number,
  cars: number,
  e: number,
  spread: number | undefined,
): FunnelLimits | undefined {
  if (measure === 'rot') return binomialLimits(Math.min(1, expected), cars);
  if (measure === 'claims') {
    const limits = poissonLimits(expected * e);
    if (!limits) return undefined;
    const { lower95, upper95, lower998, upper998 } = limits;
    return {
      ...{ lower95: lower95 / e, upper95: upper95 / e },
      ...{ lower998: lower998 / e, upper998: upper998 / e },
    };
  }
  if (spread === undefined) return undefined;
  const error = Math.sqrt(spread * cars) / e;
  const [near95, near998] = [1.959964 * error, 3.090232 * error];
  return {
    ...{ lower95: expected - near95, upper95: expected + near95 },
    ...{ lower998: expected - near998, upper998: expected + near998 },
  };
}

/** Every car's distance from what its cell's rate gives, squared. */
function variance(cars: readonly Counted[]): number | undefined {
  if (cars.length < 2) return undefined;
  const squares = cars.map((car) => {
    const rate = ratio(cars.filter(({ cell }) => cell === car.cell)) ?? 0;
    return (divided(car) - rate * car.e) ** 2;
  });
  return sum(squares) / (cars.length - 1);
}

/** On a limit is within it, and so is a hair beside it that only the order of adding up makes. */
function flagOf(value: number | null, limits: FunnelLimits | undefined) {
  if (value === null || !limits) return 'too_few' as const;
  const hair = 1e-10;
  if (value < limits.lower998 - hair) return 'below_998' as const;
  if (value > limits.upper998 + hair) return 'above_998' as const;
  if (value < limits.lower95 - hair) return 'below_95' as const;
  if (value > limits.upper95 + hair) return 'above_95' as const;
  return 'as_expected' as const;
}

function ratio(cars: readonly Counted[]): number | null {
  const e = sum(cars.map((car) => car.e));
  return e > 0 ? sum(cars.map(divided)) / e : null;
}

function divided({ parts }: Counted): number {
  return sum(Object.values(parts));
}

function regionOf(network: readonly SoldCar[], branch: string): string {
  return network.find((car) => car.branch === branch)?.region ?? '';
}

function sum(values: readonly (number | undefined)[]): number {
  return values.reduce<number>((all, value) => all + (value ?? 0), 0);
}

function near(value: number | null | undefined, digits = 9): number | null {
  return value === null || value === undefined ? null : (expect.closeTo(value, digits) as number);
}

/** Every key that the steps of a measure may have, in their order, but `mix`. */
export function stepKeys(measure: BranchMeasure): readonly string[] {
  return {
    overrun: STAGES,
    rot: BANDS,
    claims: CLAIM_CAUSES,
    product: ['CW1', 'UW1'],
    margin: ['plannedLabour', 'rotLabour', 'product', 'consumables', 'fee'],
  }[measure];
}
