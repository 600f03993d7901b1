import { STAGES } from '#shared/domain/vocabulary';
import { quantile } from '#shared/stats/quantile';
import { wilsonInterval } from '#shared/stats/wilson-interval';
import { validJob } from './small-network';

/** A car as sent, with what a quote looks at. */
export interface QuotedCar {
  branch: string;
  model: string;
  bodyType: string;
  firstRegistered: string;
  completedOn: string;
  minutes: Record<string, number>;
  products: { product: string; ml: number }[];
  consumables: { kind: string; quantity: number; unitCostCents?: number }[];
  boughtInCents: number;
  findings: { seenAs: string; workedAs?: string }[];
}

/** Numbers that look drawn and are the same in every run. */
let seed = 7;
function next(below: number): number {
  seed = (seed * 1103515245 + 12345) % 2147483648;
  return Math.floor((seed / 2147483648) * below);
}

/** So many cars of one model, body type and registration, each with labour, product and findings of its own. */
export function quotedCars(
  count: number,
  branch: string,
  [model, bodyType, firstRegistered]: readonly [string, string, string],
  completedOn = '2026-01-20',
): QuotedCar[] {
  return Array.from({ length: count }, () => ({
    ...{ branch, model, bodyType, firstRegistered, completedOn },
    minutes: Object.fromEntries(STAGES.map((stage) => [stage, 10 + next(200)])),
    products: next(4) === 0 ? [] : [{ product: 'CW1', ml: 3000 + next(2000) }],
    consumables: [
      { kind: 'trim_clip', quantity: 1 + next(9) },
      { kind: 'masking_film', quantity: 1, unitCostCents: 390 + next(10) },
    ],
    boughtInCents: next(3) === 0 ? next(5000) : 0,
    findings:
      next(2) === 0 ? [] : [{ seenAs: 'bubbling', workedAs: next(2) ? 'holed' : 'bubbling' }],
  }));
}

/** The job that such a car was. */
export function jobOf(car: QuotedCar): Record<string, unknown> {
  const { model, bodyType, firstRegistered, completedOn } = car;
  return validJob({
    vehicle: { make: 'Velder', model, bodyType, firstRegistered },
    ...{ completedOn, bookedOn: undefined, startedOn: undefined },
    actual: { stages: car.minutes },
    products: car.products,
    consumables: car.consumables,
    boughtInCents: car.boughtInCents,
    findings: car.findings.map((finding) => ({
      ...finding,
      ...{ zone: 'floor', side: 'left', structural: false, action: 'treated', repairMinutes: 0 },
    })),
    invoice: null,
  });
}

/** The figures of a set counted afresh, in doubles; the price too, which these numbers keep well away from a whole cent. */
export function recountQuote(set: readonly QuotedCar[], margin: number): Record<string, unknown> {
  const sum = (of: (car: QuotedCar) => number) => set.reduce((all, car) => all + of(car), 0);
  const at = (p: number, of: (car: QuotedCar) => number) =>
    quantile(Float64Array.from(set.map(of)).sort(), p) ?? NaN;
  const total = (car: QuotedCar) => Object.values(car.minutes).reduce((all, one) => all + one, 0);
  const whole = (value: number) => Math.floor(value + 0.5);
  const ml = sum((car) => car.products[0]?.ml ?? 0) / set.length;
  const labour = (at(0.8, total) * 3600) / 60;
  const extras =
    sum(
      (car) =>
        car.boughtInCents +
        car.consumables.reduce(
          (all, { quantity, unitCostCents }) => all + quantity * (unitCostCents ?? 43),
          0,
        ),
    ) / set.length;
  const product = (ml * 1200) / 1000;
  const worked = sum((car) => car.findings.length);
  const holed = sum((car) => car.findings.filter((each) => each.workedAs === 'holed').length);
  const share = (some: number, all: number) => {
    const { estimate, lower, upper } = wilsonInterval(some, all) ?? {};
    return { share: estimate, lower, upper };
  };
  return {
    labour: {
      p50Minutes: whole(at(0.5, total)),
      p80Minutes: whole(at(0.8, total)),
      stages: STAGES.map((stage) => ({
        stage,
        p50Minutes: whole(at(0.5, (car) => car.minutes[stage] ?? 0)),
        p80Minutes: whole(at(0.8, (car) => car.minutes[stage] ?? 0)),
      })),
    },
    rot: {
      cars: set.length,
      withRot: worked,
      ...share(worked, set.length),
    },
    openedUp: { worked, holed, ...share(holed, worked) },
    products: [{ product: 'CW1', ml }],
    priceCents: Math.ceil((labour + product + extras) / (1 - 0.05 - margin)),
    noPrice: null,
    cost: {
      ...{ marginShare: margin, marginFrom: 'asked', feeRate: 0.05, missingCosts: [] },
      labourCents: whole(labour),
      productCents: whole(product),
      consumablesAndBoughtInCents: whole(extras),
      prices: Array.from({ length: 19 }, (_, step) => ({
        marginShare: step / 20,
        priceCents: Math.ceil((labour + product + extras) / (1 - 0.05 - step / 20) - 1e-6),
      })),
    },
  };
}
