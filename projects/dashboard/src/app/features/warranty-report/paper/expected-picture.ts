import type { WarrantyReport } from '#shared/contracts/warranty-reports';
import type { DotIntervalInput } from '../../../charts/dot-interval/dot-interval-input';
import { formatCount, formatNumber } from '../../../ui/format';
import { branchName, expectedWords, limitsWords, standing } from '../report-words';

const MARKS = [
  { value: 0.25, text: 'a quarter' },
  { value: 0.5, text: 'half' },
  { value: 1, text: 'as expected' },
  { value: 2, text: 'twice' },
];

/** Branches as dots with intervals about what was expected, by code; nothing where there is no branch. */
export function expectedPicture(report: WarrantyReport): DotIntervalInput | undefined {
  const { branches } = report.answer;
  if (branches.length === 0) return undefined;
  const rows = branches.map(({ branch, claims, expected, ratio, lower, upper }) => {
    const stands = standing({ lower, upper });
    const outside = stands === 'above' || stands === 'below';
    return {
      key: branch,
      label: branchName(report, branch),
      count: `${formatCount(claims)} / ${expectedWords(expected)}`,
      value: ratio,
      lower,
      upper,
      text: ratio === null ? 'no cover yet' : formatNumber(ratio, 1),
      stand: outside ? stands : ('as_expected' as const),
      word: outside ? stands : '',
      chosen: false,
    };
  });
  return {
    rows,
    scale: 'log',
    look: 'ledger',
    reference: 1,
    marks: MARKS,
    summary: rows
      .map(({ label, text, lower, upper, word }) =>
        [label, text, limitsWords(lower, upper, 1), word].filter(Boolean).join(' '),
      )
      .join('; '),
  };
}
