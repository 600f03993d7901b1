import type { WarrantyReport } from '#shared/contracts/warranty-reports';
import { formatAmount, formatCount, formatNumber } from '../../../ui/format';
import {
  branchName,
  expectedWords,
  figureWords,
  giveOrTakeWords,
  halfYearWords,
  limitsWords,
  NO_FIGURE,
} from '../report-words';
import { number, type PaperRows, words } from './paper-rows';

/** The warranty-risk rows, one a branch and half-year (rule 51). */
export function riskRows(report: WarrantyReport): PaperRows {
  return {
    columns: [
      words('Branch'),
      words('Finished in'),
      number('Cars'),
      number('Car-years run'),
      number('Car-years left'),
      number('Claims'),
      number('Claims open'),
      number('Paid'),
      number('Per 1,000'),
      number('95 % interval'),
      number('Expected'),
      number('Ratio'),
      number('Still to come'),
      number('Give or take'),
    ],
    rows: report.rows.map((row) => [
      branchName(report, row.branch),
      halfYearWords(row.cohort),
      formatCount(row.carsCovered),
      formatNumber(row.carYearsRun, 1),
      formatNumber(row.carYearsLeft, 1),
      formatCount(row.claims),
      formatCount(row.claimsOpen),
      formatAmount(row.paidCents),
      figureWords(row.per1000, 1),
      limitsWords(row.lower, row.upper, 1),
      expectedWords(row.expected),
      figureWords(row.ratio, 2),
      row.outstandingCents === null ? NO_FIGURE : formatAmount(row.outstandingCents),
      giveOrTakeWords(row.standardErrorCents),
    ]),
  };
}
