import type { WarrantyAnswer, WarrantyBranch } from '#shared/contracts/warranty';
import type { DotIntervalInput, IntervalRow } from '../../charts/dot-interval/dot-interval-input';
import type { Column } from '../../ui/data-table/column';
import { formatCount, formatNumber } from '../../ui/format';
import type { WarrantyLinks } from './warranty-links';
import {
  expectedText,
  ratioRange,
  ratioText,
  standOf,
  standingText,
  standsAlone,
  type WarrantyWords,
} from './warranty-words';

/** Ratios that have a name of their own. */
export const EXPECTED_MARKS = [
  { value: 0.25, text: 'a quarter' },
  { value: 0.5, text: 'half' },
  { value: 1, text: 'as expected' },
  { value: 2, text: 'twice' },
];

/** A branch of few cars has an interval that would flatten all others. */
const REACH = 2.4;

/** Each branch against what its own cars lead one to expect, by name. */
export interface BranchRows {
  readonly chart: DotIntervalInput;
  readonly note: string;
  readonly columns: readonly Column<WarrantyBranch>[];
  readonly rows: readonly WarrantyBranch[];
}

/** Turns branches into their picture and table; null where nothing says what to expect. Pure. */
export function branchRows(
  answer: WarrantyAnswer,
  words: WarrantyWords,
  links: WarrantyLinks,
): BranchRows | null {
  if (answer.branches.length === 0 || standsAlone(answer)) return null;
  const name = ({ branch }: WarrantyBranch): string => words.branchName(branch);
  const rows = [...answer.branches].sort((a, b) => name(a).localeCompare(name(b), 'en'));
  return {
    rows,
    note: `Claims / expected for its packages, ages and years of cover${whoseWords(answer)}; dot and 95 % interval. Shape and word where the interval misses 1${chanceWords(rows.length)}.`,
    columns: columnsOf(name, links),
    chart: {
      summary: `Claims against expected: ${rows.map((row) => said(row, name(row))).join('; ')}.`,
      rows: rows.map((row) => intervalRow(row, name(row))),
      scale: 'log',
      reference: 1,
      reach: REACH,
      marks: EXPECTED_MARKS,
      look: 'ledger',
    },
  };
}

/** Of many branches some miss by chance alone: one in twenty. */
function chanceWords(branches: number): string {
  const chance = Math.round(branches / 20);
  return branches < 10 || chance === 0
    ? ''
    : `; by chance alone about ${formatCount(chance)} of ${formatCount(branches)} would`;
}

/** Whose rates the expectation is made of; of a network they are told without names. */
function whoseWords({ reference, scope }: WarrantyAnswer): string {
  if (reference === 'scope') return ', by the rates of the branches shown';
  return scope.branches.length === 1
    ? ', by the whole network’s rates'
    : ', by the network’s rates';
}

function intervalRow(row: WarrantyBranch, label: string): IntervalRow {
  const { branch, claims, expected, ratio, lower, upper } = row;
  const stand = standOf(row);
  return {
    key: branch,
    label,
    count: `${formatCount(claims)} / ${expectedText(expected)}`,
    value: ratio,
    lower,
    upper,
    text: ratio === null ? 'no cover yet' : ratioText(ratio),
    stand,
    word: stand === 'as_expected' ? '' : stand,
    chosen: false,
  };
}

function columnsOf(
  name: (row: WarrantyBranch) => string,
  links: WarrantyLinks,
): readonly Column<WarrantyBranch>[] {
  return [
    {
      key: 'branch',
      label: 'Branch',
      text: name,
      sortBy: name,
      link: ({ branch }) => ({ commands: ['/warranty'], query: { branch } }),
    },
    {
      key: 'cars',
      label: 'Cars',
      kind: 'number',
      text: ({ cars }) => formatCount(cars),
      link: ({ branch, cars }) =>
        cars === 0 ? undefined : links.cars({ branch, region: undefined }),
      sortBy: ({ cars }) => cars,
    },
    {
      key: 'claims',
      label: 'Claims',
      kind: 'number',
      text: ({ claims }) => formatCount(claims),
      link: ({ branch, claims }) =>
        claims === 0 ? undefined : links.claims({ branch, region: undefined }),
      sortBy: ({ claims }) => claims,
    },
    {
      key: 'expected',
      label: 'Expected',
      kind: 'number',
      text: ({ expected }) => formatNumber(expected, 1),
      sortBy: ({ expected }) => expected,
    },
    {
      key: 'ratio',
      label: 'Ratio',
      kind: 'number',
      strong: true,
      text: (row) => (row.ratio === null ? 'no cover yet' : standingText(row.ratio, row)),
      sortBy: ({ ratio }) => ratio,
    },
    {
      key: 'interval',
      label: '95 %',
      kind: 'number',
      text: ({ lower, upper }) => ratioRange(lower, upper),
    },
    {
      key: 'years',
      label: 'Car-years',
      kind: 'number',
      text: ({ carYears }) => formatCount(carYears),
      sortBy: ({ carYears }) => carYears,
    },
  ];
}

function said(row: WarrantyBranch, name: string): string {
  const { claims, expected, ratio, lower, upper } = row;
  const stand = standOf(row);
  return [
    `${name} ${formatCount(claims)} of ${expectedText(expected)}`,
    ratio === null ? 'no cover yet' : `${ratioText(ratio)} (${ratioRange(lower, upper)})`,
    stand === 'as_expected' ? '' : stand,
  ]
    .filter(Boolean)
    .join(' ');
}
