import type { WarrantyAnswer } from '#shared/contracts/warranty';
import { DAYS_A_YEAR } from '#shared/domain/warranty-cover';
import { poissonInterval } from '#shared/stats/poisson-interval';

/** Claims per 1,000 car-years with the exact interval; null without a day of cover (rule 47). */
export function claimRateOf(claims: number, days: number): WarrantyAnswer['rate'] {
  const carYears = carYearsOf(days);
  if (days === 0) return { claims, carYears, per1000: null, lower: null, upper: null };
  const { lower, upper } = poissonInterval(claims);
  const per1000 = (count: number): number => (count * 1000) / carYears;
  return {
    claims,
    carYears,
    per1000: per1000(claims),
    lower: per1000(lower),
    upper: per1000(upper),
  };
}

/** Days of cover as car-years. */
export function carYearsOf(days: number): number {
  return days / DAYS_A_YEAR;
}
