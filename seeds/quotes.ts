import type { BodyType } from '#shared/domain/vocabulary';
import type { BranchNature } from './branches';
import { BASE_PRICE_CENTS, BODY_SIZES } from './catalogue';
import type { PackageCode } from './demo-network';
import { factorAround, type Random } from './random-draws';
import { regionOf } from './regions';

/** Hourly cost against which prices are set, cents. */
const USUAL_HOURLY_CENTS = 3900;

/** The price agreed before anyone has seen the car from underneath, cents, in steps of five. `level` is that of the booking day. */
export function quotePrice(
  random: Random,
  branch: BranchNature,
  packageCode: PackageCode,
  bodyType: BodyType,
  years: number,
  level: number,
): number {
  // Dear labour is priced in for the most part; age a little, less than old cars deserve.
  const dear = 1 + 0.72 * (branch.hourlyCostCents / USUAL_HOURLY_CENTS - 1);
  const old = 1 + 0.007 * Math.min(years, 20);
  const cents =
    BASE_PRICE_CENTS[packageCode] *
    BODY_SIZES[bodyType].price *
    regionOf(branch.region).price *
    dear *
    old *
    level *
    factorAround(random, 0.035);
  return Math.round(cents / 500) * 500;
}

/** What an hour agreed beyond the quote is sold for, cents. */
export function saleHourCents(branch: BranchNature, level: number): number {
  return branch.hourlyCostCents * 1.5 * level;
}
