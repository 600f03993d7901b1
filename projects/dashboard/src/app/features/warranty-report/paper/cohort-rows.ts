import type { WarrantyAnswer } from '#shared/contracts/warranty';
import { formatAmount, formatCount } from '../../../ui/format';
import {
  expectedWords,
  figureWords,
  giveOrTakeWords,
  halfYearWords,
  limitsWords,
} from '../report-words';
import { number, type PaperRows, words } from './paper-rows';

/** Cars of each half-year: their claims against expected, what was paid for them and what is still to come. */
export function cohortRows({ cohorts, total }: WarrantyAnswer): PaperRows {
  return {
    columns: [
      words('Finished in'),
      number('Cars'),
      number('Claims'),
      number('Expected'),
      number('Ratio'),
      number('95 % interval'),
      number('Paid'),
      number('In the end'),
      number('Still to come'),
      number('Give or take'),
    ],
    rows: cohorts.map((cohort) => [
      halfYearWords(cohort.cohort),
      formatCount(cohort.cars),
      formatCount(cohort.claims),
      expectedWords(cohort.expected),
      figureWords(cohort.ratio, 2),
      limitsWords(cohort.lower, cohort.upper, 2),
      formatAmount(cohort.latestCents),
      formatAmount(cohort.ultimateCents),
      formatAmount(cohort.outstandingCents),
      giveOrTakeWords(cohort.standardErrorCents),
    ]),
    total: [
      'all',
      formatCount(sum(cohorts.map(({ cars }) => cars))),
      formatCount(sum(cohorts.map(({ claims }) => claims))),
      expectedWords(sum(cohorts.map(({ expected }) => expected))),
      '',
      '',
      formatAmount(total.latestCents),
      formatAmount(total.ultimateCents),
      formatAmount(total.outstandingCents),
      giveOrTakeWords(total.standardErrorCents),
    ],
  };
}

function sum(numbers: readonly number[]): number {
  return numbers.reduce((all, one) => all + one, 0);
}
