import type { WarrantyReport } from '#shared/contracts/warranty-reports';
import { giveOrTake } from '#shared/domain/give-or-take';
import { formatAmount, formatNumber } from '../../ui/format';

/** What stands where nothing can be said. */
export const NO_FIGURE = '–';

/** A calendar half-year: `2024-H1` → `2024 H1`. */
export function halfYearWords(halfYear: string): string {
  return halfYear.replace('-', ' ');
}

/** A branch by its name as it stood when the report was made. */
export function branchName({ branches }: WarrantyReport, code: string): string {
  return branches.find((branch) => branch.code === code)?.name ?? code;
}

/** A package code as it reads: without underscores. */
export function groupWords(key: string): string {
  return key.replaceAll('_', ' ');
}

/** Claims expected: whole from ten on, with one decimal below. */
export function expectedWords(expected: number): string {
  return formatNumber(expected, expected < 9.95 ? 1 : 0);
}

/** An estimate with so many decimals, or the sign for none. */
export function figureWords(value: number | null, decimals: number): string {
  return value === null ? NO_FIGURE : formatNumber(value, decimals);
}

/** Two limits: `0.8–1.3`. */
export function limitsWords(lower: number | null, upper: number | null, decimals: number): string {
  if (lower === null || upper === null) return NO_FIGURE;
  return `${formatNumber(lower, decimals)}–${formatNumber(upper, decimals)}`;
}

/** Half of the 95 % interval in whole units of money. */
export function giveOrTakeWords(standardErrorCents: number | null): string {
  return standardErrorCents === null ? NO_FIGURE : formatAmount(giveOrTake(standardErrorCents));
}

/** Where an interval lies against 1. */
export function standing({
  lower,
  upper,
}: {
  readonly lower: number | null;
  readonly upper: number | null;
}): 'above' | 'below' | 'as expected' | 'no figure' {
  if (lower === null || upper === null) return 'no figure';
  if (lower > 1) return 'above';
  return upper < 1 ? 'below' : 'as expected';
}
