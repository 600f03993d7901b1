import type { JobRow } from '#shared/contracts/job-list';
import type { Column } from '../../ui/data-table/column';
import {
  formatAmount,
  formatDays,
  formatMinutes,
  formatShare,
  formatShortDate,
  formatSignedMinutes,
} from '../../ui/format';

/** What the columns of the list need to know beside the row. */
export interface JobColumnsInput {
  readonly branchName: (code: string) => string;
  readonly packageWord: (code: string) => string;
  /** Several branches are seen, so each row says whose it is. */
  readonly branches: 'one' | 'several';
  /** Recorders see no money. */
  readonly money: 'shown' | 'hidden';
}

/** Where a row leads. */
export function jobLink(row: JobRow): readonly unknown[] {
  return ['/jobs', row.branch, row.jobRef];
}

/** Make, model and the year of first registration. */
export function carWords(row: JobRow): { readonly name: string; readonly year: string } {
  const { make, model, firstRegistered } = row.vehicle;
  return { name: `${make} ${model}`, year: firstRegistered.slice(0, 4) };
}

/** Whether a job is billed, and if not, since when it waits. */
export function billWords(row: JobRow): string {
  if (!row.unbilled) return 'billed';
  return row.daysWaiting === null || row.daysWaiting === 0
    ? 'not billed'
    : `not billed, ${formatDays(row.daysWaiting)}`;
}

/** The columns of the list of jobs. */
export function jobColumns(known: JobColumnsInput): readonly Column<JobRow>[] {
  const work: Column<JobRow>[] = [
    {
      key: 'job',
      label: 'Job',
      text: (row) => row.jobRef,
      link: (row) => ({ commands: jobLink(row) }),
    },
    ...(known.branches === 'several'
      ? [
          {
            key: 'branch',
            label: 'Branch',
            text: (row: JobRow) => known.branchName(row.branch),
          },
        ]
      : []),
    {
      key: 'car',
      label: 'Car',
      text: (row) => carWords(row).name,
      quiet: (row) => carWords(row).year,
    },
    {
      key: 'package',
      label: 'Package',
      text: (row) => known.packageWord(row.package),
      muted: () => true,
    },
    { key: 'completed', label: 'Finished', text: (row) => formatShortDate(row.completedOn) },
    { key: 'rot', label: 'Rot', text: (row) => (row.hasRot ? 'found' : '') },
    {
      key: 'worked',
      label: 'Worked',
      kind: 'number',
      text: (row) => formatMinutes(row.actualMinutes),
    },
    {
      key: 'overrun',
      label: 'Over estimate',
      kind: 'number',
      text: (row) =>
        row.overrunMinutes === null ? 'no estimate' : formatSignedMinutes(row.overrunMinutes),
      muted: (row) => row.overrunMinutes === null,
    },
  ];
  return known.money === 'hidden'
    ? [...work, { key: 'bill', label: 'Bill', text: billWords, muted: (row) => !row.unbilled }]
    : [...work, ...MONEY];
}

const MONEY: readonly Column<JobRow>[] = [
  {
    key: 'billed',
    label: 'Billed',
    kind: 'number',
    text: (row) => (row.unbilled ? billWords(row) : amount(row.revenueCents)),
    muted: (row) => row.unbilled,
  },
  {
    key: 'kept',
    label: 'Kept',
    kind: 'number',
    strong: true,
    text: (row) => amount(row.marginCents),
  },
  {
    key: 'share',
    label: '%',
    kind: 'number',
    text: (row) => (row.marginShare == null ? '' : formatShare(row.marginShare)),
  },
];

function amount(cents: number | null | undefined): string {
  return cents == null ? '' : formatAmount(cents);
}
