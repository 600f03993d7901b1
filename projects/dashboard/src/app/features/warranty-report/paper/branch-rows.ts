import type { WarrantyReport } from '#shared/contracts/warranty-reports';
import { formatCount } from '../../../ui/format';
import { branchName, expectedWords, figureWords, limitsWords, standing } from '../report-words';
import { number, type PaperRows, words } from './paper-rows';

/** Claims of each branch against what the network's rates let expect, in the order of the answer: never by the ratio. */
export function branchRows(report: WarrantyReport): PaperRows {
  return {
    columns: [
      words('Branch'),
      words('Code'),
      number('Cars'),
      number('Car-years run'),
      number('Claims'),
      number('Expected'),
      number('Ratio'),
      number('95 % interval'),
      words('Stands'),
    ],
    rows: report.answer.branches.map((row) => [
      branchName(report, row.branch),
      row.branch,
      formatCount(row.cars),
      formatCount(row.carYears),
      formatCount(row.claims),
      expectedWords(row.expected),
      figureWords(row.ratio, 2),
      limitsWords(row.lower, row.upper, 2),
      standing(row),
    ]),
  };
}
