import type { JobRow } from '#shared/contracts/job-list';
import type { Column } from '../../ui/data-table/column';
import { formatAmount, formatCars, formatShare, formatSignedAmount } from '../../ui/format';
import type { Standing, WeekAnswers } from './week-standing';
import { STEP_WORDS, type WeekWords } from './week-words';

/** A car's difference is "as planned" while it stays within this part of what was billed (this product's own choice). */
export const AS_PLANNED_SHARE = 0.02;

/** The table of the cars that made the week: worst first, its total row counted from the cents. */
export function weekCarColumns(
  answers: WeekAnswers,
  standing: Standing,
  words: WeekWords,
): readonly Column<JobRow>[] {
  const { figures, cars } = standing;
  const { bridge, scope } = answers.week;
  const billed = figures.revenueCents;
  const share = figures.marginShare;
  const branch: Column<JobRow> = {
    key: 'branch',
    label: 'Branch',
    text: (row) => words.branchName(row.branch),
    sortBy: (row) => words.branchName(row.branch),
    total: '',
  };
  return [
    {
      key: 'job',
      label: 'Job',
      text: ({ jobRef }) => jobRef,
      link: ({ branch, jobRef }) => ({ commands: ['/jobs', branch, jobRef] }),
      sortBy: ({ jobRef }) => jobRef,
      total: formatCars(cars),
    },
    ...(scope.branches.length > 1 ? [branch] : []),
    {
      key: 'car',
      label: 'Car',
      text: ({ vehicle }) => `${vehicle.make} ${vehicle.model}`,
      quiet: ({ vehicle }) => vehicle.firstRegistered.slice(0, 4),
      sortBy: ({ vehicle }) => `${vehicle.make} ${vehicle.model}`,
      total: '',
    },
    {
      key: 'package',
      label: 'Package',
      text: packageWord,
      muted: () => true,
      sortBy: packageWord,
      total: '',
    },
    money('billed', 'Billed', (row) => row.revenueCents, formatAmount(billed)),
    money(
      'expected',
      'Expected',
      (row) => row.expectedMarginCents,
      bridge.cars > 0 ? formatAmount(bridge.expectedMarginCents) : '',
    ),
    {
      ...money('kept', 'Kept', (row) => row.marginCents, formatAmount(figures.marginCents)),
      strong: true,
    },
    {
      key: 'share',
      label: '%',
      kind: 'number',
      text: ({ marginShare }) => ((marginShare ?? null) === null ? '' : formatShare(marginShare!)),
      sortBy: ({ marginShare }) => marginShare ?? null,
      firstSort: 'asc',
      total: share === null ? '' : formatShare(share),
    },
    {
      key: 'difference',
      label: 'Difference',
      kind: 'number',
      text: (row) => signedText(differenceOf(row)),
      sortBy: differenceOf,
      firstSort: 'asc',
      total:
        bridge.cars > 0 ? formatSignedAmount(bridge.marginCents - bridge.expectedMarginCents) : '',
    },
    {
      key: 'bar',
      label: 'Difference drawn',
      unseenLabel: true,
      text: () => '',
      bar: differenceOf,
      total: '',
    },
    {
      key: 'step',
      label: 'Largest step',
      text: largestStepText,
      muted: (row) => !hasStep(row),
      total: '',
    },
  ];
}

/** Columns in the order in which a phone shows them before it scrolls. */
const TELLING = [
  'job',
  'car',
  'difference',
  'share',
  'kept',
  'step',
  'bar',
  'branch',
  'expected',
  'billed',
];

/** The same columns with the most telling ones first, for a narrow window. */
export function tellingFirst(columns: readonly Column<JobRow>[]): readonly Column<JobRow>[] {
  const place = ({ key }: Column<JobRow>): number =>
    TELLING.includes(key) ? TELLING.indexOf(key) : TELLING.length;
  return [...columns].sort((a, b) => place(a) - place(b));
}

/** What stands under the table's title. */
export function weekCarsNote(
  answers: WeekAnswers,
  standing: Standing,
  currencySign: string,
): string {
  const { bridge } = answers.week;
  const basis = `${currencySign} before tax, rounded; the total is of the cents`;
  if (bridge.cars === standing.cars) return basis;
  return `${basis}; expected and difference of the ${formatCars(bridge.cars)} with an estimate and a norm`;
}

/** Kept minus expected margin in cents; null without either. */
export function differenceOf({ marginCents, expectedMarginCents }: JobRow): number | null {
  const kept = marginCents ?? null;
  const expected = expectedMarginCents ?? null;
  return kept === null || expected === null ? null : kept - expected;
}

/** The step that explains a car: "rot labour −186", "as planned", or why there is none. */
export function largestStepText(row: JobRow): string {
  if ((row.marginCents ?? null) === null) return 'cost missing';
  if (differenceOf(row) === null) return row.estimatedMinutes === null ? 'no estimate' : 'no norm';
  if (!hasStep(row)) return 'as planned';
  const { step, cents } = row.largestStep!;
  // The one long name is cut to its first word, so that the table fits beside the unbilled cars.
  const name = step === 'consumables' ? 'consumables' : STEP_WORDS[step];
  return `${name} ${formatSignedAmount(cents)}`;
}

function hasStep(row: JobRow): boolean {
  const difference = differenceOf(row);
  if (difference === null || !row.largestStep) return false;
  return Math.abs(difference) > AS_PLANNED_SHARE * (row.revenueCents ?? 0);
}

/** The package as the trade word it is sold under: its code, which is shorter than its name. */
export function packageWord(row: Pick<JobRow, 'package'>): string {
  return row.package.replaceAll('_', ' ');
}

function money(
  key: string,
  label: string,
  value: (row: JobRow) => number | null | undefined,
  total: string,
): Column<JobRow> {
  return {
    key,
    label,
    kind: 'number',
    text: (row) => amountText(value(row)),
    sortBy: (row) => value(row) ?? null,
    total,
  };
}

function amountText(cents: number | null | undefined): string {
  return cents === null || cents === undefined ? '' : formatAmount(cents);
}

function signedText(cents: number | null): string {
  return cents === null ? '' : formatSignedAmount(cents);
}
