import { requireFinite } from './require-finite';

/** A place's air over a year: mean temperature and relative humidity, mean depositions in mg a square metre and day. */
export interface YearlyClimate {
  temperatureC: number;
  humidityPct: number;
  so2Deposition: number;
  chlorideDeposition: number;
}

/** The corrosivity categories of the standard, from very low to extreme. */
export type CorrosivityCategory = 'C1' | 'C2' | 'C3' | 'C4' | 'C5' | 'CX';

/** How fast bare carbon steel rusts there in its first year. */
export interface CorrosionRate {
  umPerYear: number;
  /** Null above 700 µm a year, where the standard names no category. */
  category: CorrosivityCategory | null;
  /** True when one of the inputs lies outside those the formula was fitted on (rule 36). */
  outsideFittedRange: boolean;
}

/** Upper bounds, inclusive, in µm a year. */
const CATEGORIES: readonly (readonly [CorrosivityCategory, number])[] = [
  ['C1', 1.3],
  ['C2', 25],
  ['C3', 50],
  ['C4', 80],
  ['C5', 200],
  ['CX', 700],
];

/**
 * The first-year corrosion of carbon steel from a place's yearly climate. A comparison between places, not a prediction for
 * a car: it knows open air, not road salt thrown into a cavity.
 *
 * Source: ISO 9223:2012, equation (1), table 2 (categories) and table 3 (fitted range), as quoted by secondary sources.
 */
export function corrosionRate(climate: YearlyClimate): CorrosionRate {
  const temperature = requireFinite(climate.temperatureC, 'temperature');
  const humidity = requireAtLeastZero(climate.humidityPct, 'humidity');
  const so2 = requireAtLeastZero(climate.so2Deposition, 'SO2 deposition');
  const chloride = requireAtLeastZero(climate.chlorideDeposition, 'chloride deposition');
  if (humidity > 100) throw new RangeError(`humidity must be 0 to 100 %, got ${humidity}`);
  const warmth = temperature - 10;
  const wetness = warmth <= 0 ? 0.15 * warmth : -0.054 * warmth;
  const umPerYear =
    1.77 * so2 ** 0.52 * Math.exp(0.02 * humidity + wetness) +
    0.102 * chloride ** 0.62 * Math.exp(0.033 * humidity + 0.04 * temperature);
  return {
    umPerYear,
    category: corrosivityCategory(umPerYear),
    outsideFittedRange: !(
      isWithin(temperature, -17.1, 28.7) &&
      isWithin(humidity, 34, 93) &&
      isWithin(so2, 0.7, 150.4) &&
      isWithin(chloride, 0.4, 760.5)
    ),
  };
}

/** The category of a first-year rate in µm, unrounded; null above 700. Source: ISO 9223:2012, table 2. */
export function corrosivityCategory(umPerYear: number): CorrosivityCategory | null {
  return CATEGORIES.find(([, upTo]) => umPerYear <= upTo)?.[0] ?? null;
}

function isWithin(value: number, from: number, to: number): boolean {
  return value >= from && value <= to;
}

function requireAtLeastZero(value: number, name: string): number {
  if (requireFinite(value, name) < 0)
    throw new RangeError(`${name} must not be negative: ${value}`);
  return value;
}
