import type { FactsByKind } from '#shared/domain/signal-facts';
import { plainSignal, type CarBehind, type FoundSignal } from './found-signal';

/** How far back odd values are looked for: a quarter, after which its figures have been read. */
export const ODD_DAYS = 91;
/** Minutes of one stage: 20 hours, three working days on one step, are a slipped key rather than work. */
export const LONG_STAGE = 1200;
/** Millilitres of one product: 40 litres are more than any car takes, and a factor of ten above what most take. */
export const MUCH_PRODUCT = 40_000;
/** Cars in a row whose every stage took its estimate to the minute before it is a copy: a single one may be chance. */
const COPIES = 20;

/** A car of the last weeks with what may be odd of it. */
export interface CheckedCar {
  ref: string;
  completedOn: string;
  /** Longest stage, most of one product; `zeroPrice` and `zeroBill` where there is one and it is nothing. */
  longestStage: number;
  mostMl: number;
  zeroPrice: boolean;
  zeroBill: boolean;
}

/** A car with an estimate; `copied` where every stage took its estimate to the minute. */
export interface TimedCar {
  ref: string;
  completedOn: string;
  copied: boolean;
}

/** What was recorded at a branch in the last 91 days. */
export interface RecordedValues {
  branchId: number;
  /** Cars with something odd, oldest first. */
  odd: readonly CheckedCar[];
  /** Cars with an estimate, the newest first. */
  timed: readonly TimedCar[];
}

/** Values that look wrong, each car with why. They end when corrected, or after a quarter. */
export function detectOddValues({ branchId, odd, timed }: RecordedValues): FoundSignal[] {
  const whys = new Map<string, { on: string; why: string[] }>();
  const say = (ref: string, on: string, why: string): void => {
    const known = whys.get(ref) ?? { on, why: [] };
    known.why.push(why);
    whys.set(ref, known);
  };
  const found = { longStages: 0, muchProduct: 0, zeroPrices: 0 };
  for (const { ref, completedOn, longestStage, mostMl, zeroPrice, zeroBill } of odd) {
    if (longestStage >= LONG_STAGE) {
      found.longStages += 1;
      say(ref, completedOn, `a stage of ${Math.round(longestStage / 60)} hours`);
    }
    if (mostMl >= MUCH_PRODUCT) {
      found.muchProduct += 1;
      say(ref, completedOn, `${Math.round(mostMl / 1000)} litres of one product`);
    }
    if (zeroPrice || zeroBill) found.zeroPrices += 1;
    if (zeroPrice) say(ref, completedOn, 'a quoted price of nothing');
    if (zeroBill) say(ref, completedOn, 'a bill of nothing');
  }
  const copies = copiedCars(timed);
  for (const { ref, completedOn } of copies) {
    say(ref, completedOn, 'every stage took exactly its estimate');
  }
  if (whys.size === 0) return [];
  const cars = [...whys].map(([ref, { on, why }]) => ({ ref, on, why: why.join('; ') }));
  cars.sort((a, b) => (a.on === b.on ? 0 : a.on < b.on ? -1 : 1));
  const facts: FactsByKind['odd_values'] = { ...found, copiedMinutes: copies.length };
  return [
    plainSignal({
      branchId,
      kind: 'odd_values',
      key: 'odd',
      since: (cars[0] as { on: string }).on,
      strength: cars.length,
      facts: { ...facts },
      cars: cars.length,
      listed: cars.map(({ ref, why }): CarBehind => ({ ref, why })),
    }),
  ];
}

/** The newest cars in a row that are copies, when they are enough to tell. */
function copiedCars(timed: readonly TimedCar[]): readonly TimedCar[] {
  const first = timed.findIndex(({ copied }) => !copied);
  const row = first < 0 ? timed : timed.slice(0, first);
  return row.length >= COPIES ? row : [];
}
