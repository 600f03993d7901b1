import { CAR_MODELS, type CarModel } from './car-models';
import { between, chance, pickWeighted, uniform, wholeBetween, type Random } from './random-draws';
import type { Side, Zone } from '#shared/domain/vocabulary';

/** A car that a branch has seen. */
export interface Car {
  key: string;
  model: CarModel;
  /** Month of first registration, counted from year 0: year · 12 + month − 1. */
  registeredMonth: number;
  odometerKm: number;
  kmPerYear: number;
  /** Rot that was put off when it was last here. */
  open: { zone: Zone; side: Side }[];
  lastCompleted: number;
}

/** Ages of the cars that come in, by band of five years, for a region where young cars are neither rare nor common. */
const AGES: readonly (readonly [number, number])[] = [
  [0, 0.26],
  [5, 0.31],
  [10, 0.26],
  [15, 0.13],
  [20, 0.04],
];

const CLASSIC_SHARE = 0.022;

/** A car never seen before. `month` is the month in which it is booked; `younger` shifts the mix towards young cars. */
export function drawCar(
  random: Random,
  key: string,
  month: number,
  thisMonth: number,
  younger: number,
): Car {
  const classic = chance(random, CLASSIC_SHARE);
  const ageMonths = classic ? wholeBetween(random, 34 * 12, 50 * 12) : ordinaryAge(random, younger);
  // Models are dated back from today, so that a model's years stay the same through the five years.
  const builtYearsBack = Math.floor((thisMonth - month + ageMonths) / 12);
  const model = pickWeighted(random, classic ? CLASSICS : modelsBuilt(builtYearsBack));
  const kmPerYear = Math.round(between(random, 6, 22)) * 1000;
  return {
    key,
    model,
    registeredMonth: month - ageMonths,
    odometerKm: Math.round((kmPerYear * Math.min(ageMonths, 240)) / 12 / 100) * 100 + 300,
    kmPerYear,
    open: [],
    lastCompleted: 0,
  };
}

/** A month counted from year 0, as `YYYY-MM`. */
export function monthText(month: number): string {
  const year = Math.floor(month / 12);
  return `${year}-${String((month % 12) + 1).padStart(2, '0')}`;
}

/** The month of a date, counted from year 0. */
export function monthNumber(date: string): number {
  return Number(date.slice(0, 4)) * 12 + Number(date.slice(5, 7)) - 1;
}

function ordinaryAge(random: Random, younger: number): number {
  const band = pickWeighted(random, AGES);
  const years = younger > 0 && band >= 10 && uniform(random) < younger * 3 ? band - 10 : band;
  const moved = younger < 0 && band < 10 && uniform(random) < -younger * 2 ? band + 5 : years;
  return Math.max(2, moved * 12 + wholeBetween(random, 0, 59));
}

const CLASSICS = weighed(CAR_MODELS.filter((model) => model.bodyType === 'classic'));
const ORDINARY = CAR_MODELS.filter((model) => model.bodyType !== 'classic');

/** Models by the year in which they were built, counted back from today; made once. */
const BUILT = new Map<number, readonly (readonly [CarModel, number])[]>();

function modelsBuilt(yearsBack: number): readonly (readonly [CarModel, number])[] {
  const known = BUILT.get(yearsBack);
  if (known) return known;
  const models = weighed(
    ORDINARY.filter((model) => yearsBack <= model.builtFrom && yearsBack >= model.builtUntil),
  );
  BUILT.set(yearsBack, models);
  return models;
}

function weighed(models: readonly CarModel[]): readonly (readonly [CarModel, number])[] {
  return models.map((model) => [model, model.popularity] as const);
}
