import type { ProductBranch } from '#shared/contracts/products';
import type {
  DotIntervalInput,
  IntervalRow,
  Stand,
} from '../../charts/dot-interval/dot-interval-input';
import type { CellLink, Column } from '../../ui/data-table/column';
import { formatCount, formatShare } from '../../ui/format';
import { intervalText, type ProductWords } from './product-words';

/** Ratios that have a name of their own, offered to the axis. */
const MARKS = [
  { value: 0.5, text: 'half' },
  { value: 0.8, text: '80 %' },
  { value: 0.9, text: '90 %' },
  { value: 1, text: 'as the norm' },
  { value: 1.1, text: '110 %' },
  { value: 1.25, text: '125 %' },
  { value: 1.5, text: 'half again' },
  { value: 2, text: 'twice' },
];

/** Each branch against the norm of its own cars, by name. */
export interface BranchRatios {
  readonly ratios: DotIntervalInput;
  readonly columns: readonly Column<ProductBranch>[];
  readonly rows: readonly ProductBranch[];
}

/** Turns branches into their picture and table; a single branch is the page's answer already. */
export function branchRatios(
  branches: readonly ProductBranch[],
  words: ProductWords,
  linkOf: (branch: string) => CellLink,
): BranchRatios | null {
  if (branches.length < 2) return null;
  const name = ({ branch }: ProductBranch): string => words.branchName(branch);
  const rows = [...branches].sort((a, b) => name(a).localeCompare(name(b), 'en'));
  return {
    ratios: {
      summary: `Product used against the norm: ${rows.map((row) => said(row, words)).join('; ')}.`,
      rows: rows.map((row) => intervalRow(row, words)),
      scale: 'log',
      reference: 1,
      marks: MARKS,
    },
    rows,
    columns: [
      {
        key: 'branch',
        label: 'Branch',
        text: name,
        link: ({ branch }) => linkOf(branch),
        sortBy: name,
      },
      {
        key: 'cars',
        label: 'Cars',
        kind: 'number',
        text: ({ cars }) => formatCount(cars),
        sortBy: ({ cars }) => cars,
      },
      {
        key: 'ratio',
        label: 'Of the norm',
        kind: 'number',
        strong: ({ ratioToNorm }) => ratioToNorm !== null,
        muted: ({ ratioToNorm }) => ratioToNorm === null,
        text: ({ ratioToNorm }) => ratioText(ratioToNorm),
        sortBy: ({ ratioToNorm }) => ratioToNorm,
      },
      {
        key: 'interval',
        label: '95 %',
        kind: 'number',
        text: ({ lower, upper }) => intervalText(lower, upper),
      },
      { key: 'word', label: 'Against the norm', text: (row) => wordOf(standOf(row)) },
    ],
  };
}

function intervalRow(row: ProductBranch, words: ProductWords): IntervalRow {
  const stand = standOf(row);
  return {
    key: row.branch,
    label: words.branchName(row.branch),
    count: formatCount(row.cars),
    value: row.ratioToNorm,
    lower: row.lower,
    upper: row.upper,
    text: ratioText(row.ratioToNorm),
    stand,
    word: wordOf(stand),
    chosen: false,
  };
}

function standOf({ lower, upper }: ProductBranch): Stand {
  if (lower !== null && lower > 1) return 'above';
  if (upper !== null && upper < 1) return 'below';
  return 'as_expected';
}

function wordOf(stand: Stand): string {
  return stand === 'as_expected' ? '' : stand;
}

function ratioText(ratio: number | null): string {
  return ratio === null ? 'too few cars yet' : formatShare(ratio);
}

function said(row: ProductBranch, words: ProductWords): string {
  const parts = [
    words.branchName(row.branch),
    ratioText(row.ratioToNorm),
    row.lower === null ? '' : `(${intervalText(row.lower, row.upper)})`,
    wordOf(standOf(row)),
  ];
  return parts.filter(Boolean).join(' ');
}
