import { addDays } from '#shared/domain/calendar';
import { BRANCHES } from './branches';
import type { DemoSetUp, ProductCode } from './demo-network';
import type { ConsumableKind } from '#shared/domain/vocabulary';

/** Costs and prices rise by this much a year; both together, so that margins stay where they are. */
const YEARLY_RISE = 1.034;

/** Present cost per litre, cents. */
const LITRE_CENTS: Record<ProductCode, number> = {
  CW1: 1180,
  UW1: 1260,
  SC1: 980,
  RC1: 1520,
  ZP1: 1580,
  SS1: 1440,
};

/** Present cost a piece, cents. */
const PIECE_CENTS: Record<ConsumableKind, number> = {
  trim_clip: 45,
  blanking_plug: 60,
  masking_film: 420,
  patch_steel: 950,
  other: 350,
};

/** The first day of the demo's five years. */
export function firstDay(today: string): string {
  return `${Number(today.slice(0, 4)) - 5}${today.slice(4) === '-02-29' ? '-02-28' : today.slice(4)}`;
}

/** The day from which every cost is known: some weeks before the first job. */
export function costsKnownFrom(today: string): string {
  return addDays(firstDay(today), -60);
}

/** Cost and price level of a day against today's year: 1.034 a year, stepping on 1 January. */
export function levelOn(date: string, today: string): number {
  return YEARLY_RISE ** (Number(date.slice(0, 4)) - Number(today.slice(0, 4)));
}

/** Hourly costs of every branch, new each 1 January. */
export function hourlyCosts(today: string): DemoSetUp['rates'] {
  return BRANCHES.flatMap((branch) =>
    datesEachYear(today, '01-01').map((from) => ({
      branch: branch.code,
      from,
      hourlyCostCents: nearest(branch.hourlyCostCents * levelOn(from, today), 10),
    })),
  );
}

/** Product costs, new each 1 March. */
export function productCosts(today: string): DemoSetUp['productCosts'] {
  return (Object.keys(LITRE_CENTS) as ProductCode[]).flatMap((product) =>
    datesEachYear(today, '03-01').map((from) => ({
      product,
      from,
      costPerLitreCents: nearest(LITRE_CENTS[product] * levelOn(from, today), 5),
    })),
  );
}

/** Consumable costs, new every 1 May. */
export function consumableCosts(today: string): DemoSetUp['consumableCosts'] {
  return (Object.keys(PIECE_CENTS) as ConsumableKind[]).flatMap((kind) =>
    datesEachYear(today, '05-01').map((from) => ({
      kind,
      from,
      unitCostCents: Math.round(PIECE_CENTS[kind] * levelOn(from, today)),
    })),
  );
}

/** The fee rate from the start, a fraction of revenue. */
export const FIRST_FEE_RATE = 0.055;

/** The one change of the fee: half a point more from three calendar years ago. */
export function fees(today: string): DemoSetUp['fees'] {
  return [{ from: `${Number(today.slice(0, 4)) - 3}-01-01`, feeRate: 0.06 }];
}

/** The day from which costs are known, then one day of every calendar year up to today. */
function datesEachYear(today: string, monthAndDay: string): string[] {
  const start = costsKnownFrom(today);
  const dates = [start];
  for (let year = Number(start.slice(0, 4)); year <= Number(today.slice(0, 4)); year += 1) {
    const date = `${year}-${monthAndDay}`;
    if (date > start && date <= today) dates.push(date);
  }
  return dates;
}

function nearest(value: number, step: number): number {
  return Math.round(value / step) * step;
}
