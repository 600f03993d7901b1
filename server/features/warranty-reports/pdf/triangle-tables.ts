import type { WarrantyAnswer } from '#shared/contracts/warranty';
import { decimals, exactMoney, halfYearWords, orDash, whole } from './format';
import { heading } from './headings';
import type { Paper } from './paper';
import { table } from './table';

type PaidTriangle = WarrantyAnswer['triangle'];

/** Columns of money, to the cent, that stand beside each other on a page that lies. */
const ACROSS = 12;

/** The paid triangle and its factors to the cent, with the sums they are made of, so that it can be redone by hand. */
export function triangleTables(paper: Paper, { rows, factors }: PaidTriangle, sign: string): void {
  const widest = Math.max(0, ...rows.map(({ cumulativeCents }) => cumulativeCents.length));
  heading(
    paper,
    `Paid in all up to each half-year of age, ${sign}`,
    'Rows: half-year in which the cars were finished. Columns: half-years since then, 0 is the same. A row ends where payments are counted up to.',
  );
  for (let from = 0; from < widest; from += ACROSS) {
    const ages = Array.from(
      { length: Math.min(ACROSS, widest - from) },
      (_, index) => from + index,
    );
    const reaching = rows.filter(({ cumulativeCents }) => cumulativeCents.length > from);
    table(
      paper,
      [
        {
          head: 'finished in',
          wide: 1,
          align: 'left',
          cell: ({ cohort }) => halfYearWords(cohort),
        },
        ...ages.map((age) => ({
          head: String(age),
          wide: 1,
          cell: ({ cumulativeCents }: PaidTriangle['rows'][number]) => {
            const cents = cumulativeCents[age];
            return cents === undefined ? '' : exactMoney(cents);
          },
        })),
      ],
      reaching,
      { size: 7.5, width: (paper.width * (ages.length + 1)) / (Math.min(ACROSS, widest) + 1) },
    );
  }
  heading(
    paper,
    'Factors from one half-year of age to the next',
    'Factor = sum after / sum before, over the same rows of the triangle. What is paid in the end = the last figure of a row × all factors from its age on. Sigma² is Mack’s variance parameter, in cents.',
  );
  table(
    paper,
    [
      { head: 'from', wide: 2, align: 'left', cell: ({ development }) => whole(development) },
      { head: 'to', wide: 2, align: 'left', cell: ({ development }) => whole(development + 1) },
      { head: `sum before, ${sign}`, wide: 4, cell: ({ fromCents }) => exactMoney(fromCents) },
      { head: `sum after, ${sign}`, wide: 4, cell: ({ toCents }) => exactMoney(toCents) },
      { head: 'factor', wide: 4, cell: ({ factor }) => decimals(factor, 8) },
      {
        head: 'sigma²',
        wide: 5,
        cell: ({ sigmaSquared }) => orDash(sigmaSquared, (value) => decimals(value, 6)),
      },
    ],
    factors,
    { size: 8, width: paper.width * 0.75 },
  );
}
