import type { WarrantyAnswer } from '#shared/contracts/warranty';
import { formatExactAmount, formatNumber } from '../../../ui/format';
import { halfYearWords, NO_FIGURE } from '../report-words';
import { number, type PaperRows, words } from './paper-rows';

/** As many half-years of age beside each other as a sheet of paper has room for. */
const BESIDE = 8;

/** What was paid in all up to each half-year of age, to the cent; in several tables where it is wider than a sheet. */
export function triangleRows({ triangle: { rows } }: WarrantyAnswer): readonly PaperRows[] {
  const ages = Math.max(0, ...rows.map(({ cumulativeCents }) => cumulativeCents.length));
  const tables: PaperRows[] = [];
  for (let from = 0; from < ages; from += BESIDE) {
    const columns = Array.from({ length: Math.min(BESIDE, ages - from) }, (_, at) => from + at);
    tables.push({
      columns: [words('Finished in'), ...columns.map((age) => number(ageWords(age)))],
      rows: rows
        .filter(({ cumulativeCents }) => cumulativeCents.length > from)
        .map(({ cohort, cumulativeCents }) => [
          halfYearWords(cohort),
          ...columns.map((age) => {
            const cents = cumulativeCents[age];
            return cents === undefined ? '' : formatExactAmount(cents);
          }),
        ]),
    });
  }
  return tables;
}

/** The factor from each half-year of age to the next, with the two sums it is made of. */
export function factorRows({ triangle: { factors } }: WarrantyAnswer): PaperRows {
  return {
    columns: [
      words('From … to half-year of age'),
      number('Paid up to the first'),
      number('Paid up to the second'),
      number('Factor'),
      number('σ², cents'),
    ],
    rows: factors.map(({ development, fromCents, toCents, factor, sigmaSquared }) => [
      `${ageWords(development)} to ${ageWords(development + 1)}`,
      formatExactAmount(fromCents),
      formatExactAmount(toCents),
      formatNumber(factor, 6),
      sigmaSquared === null ? NO_FIGURE : formatNumber(sigmaSquared, 2),
    ]),
  };
}

/** A half-year of age: 0 is the one in which the car was finished. */
function ageWords(age: number): string {
  return age === 0 ? 'own' : `+${age}`;
}
