import type { ComeBack } from '#shared/contracts/come-back';
import { isDangerous } from '#shared/domain/danger';
import type { WaitDotsInput } from '../../charts/wait-dots/wait-dots-input';
import { weeksSince } from '../../ui/come-back/come-back-words';
import type { Column } from '../../ui/data-table/column';
import { formatCount, formatCounted } from '../../ui/format';

/** Findings of one gravity, and how long they have been on their cars. */
export interface WaitGroup {
  readonly key: 'dangerous' | 'holed' | 'other';
  readonly label: string;
  readonly findings: number;
  readonly notTold: number;
  /** Whole weeks; null with fewer than 5 cars behind it (rule 13). */
  readonly median: number | null;
  readonly longest: number;
}

/** The picture of the wait and the same figures as rows. */
export interface WaitPicture {
  readonly data: WaitDotsInput;
  readonly note: string;
  readonly rows: readonly WaitGroup[];
  readonly columns: readonly Column<WaitGroup>[];
}

/** Cars from which on a quantile is said. */
const LEAST_CARS = 5;

const GROUPS: readonly Pick<WaitGroup, 'key' | 'label'>[] = [
  { key: 'dangerous', label: 'dangerous' },
  { key: 'holed', label: 'holed' },
  { key: 'other', label: 'bubbling or surface' },
];

const MARKS = [
  { value: 0, text: '0 weeks' },
  { value: 26, text: '½ year' },
  { value: 52, text: '1 year' },
  { value: 104, text: '2 years' },
  { value: 156, text: '3 years' },
  { value: 208, text: '4 years' },
  { value: 260, text: '5 years' },
];

/** Draws the findings at hand; `behind` more stand further down the list than what was fetched. */
export function waitPicture(
  items: readonly ComeBack[],
  today: string,
  behind: number,
): WaitPicture | undefined {
  const groups = GROUPS.map((group) => {
    const own = items.filter((item) => groupOf(item) === group.key);
    return { group: groupFigures(group, own, today), own };
  }).filter(({ own }) => own.length > 0);
  if (groups.length === 0) return undefined;
  const rows = groups.map(({ group }) => group);
  return {
    rows,
    columns: COLUMNS,
    note: [
      'Weeks since the car left. Each mark is a finding; a ring: dangerous, and its owner not told in writing',
      ...(behind > 0 ? [`the first ${formatCount(items.length)} of the list`] : []),
    ].join('; '),
    data: {
      summary: rows.map(sentenceOf).join(' '),
      marks: MARKS,
      rows: groups.map(({ group, own }) => ({
        key: group.key,
        label: group.label,
        count: formatCount(own.length),
        danger: group.key === 'dangerous',
        median: group.median,
        text: medianWords(group),
        dots: own.map((item) => ({
          value: weeksSince(item.completedOn, today),
          ringed: isDangerous(item) && item.ownerToldOn === null,
        })),
      })),
    },
  };
}

function groupOf(item: ComeBack): WaitGroup['key'] {
  if (isDangerous(item)) return 'dangerous';
  const { seenAs, workedAs } = item;
  return seenAs === 'holed' || workedAs === 'holed' ? 'holed' : 'other';
}

function groupFigures(
  group: Pick<WaitGroup, 'key' | 'label'>,
  own: readonly ComeBack[],
  today: string,
): WaitGroup {
  const weeks = own.map((item) => weeksSince(item.completedOn, today)).sort((a, b) => a - b);
  const cars = new Set(own.map(({ branch, jobRef }) => `${branch} ${jobRef}`)).size;
  const upper = weeks[Math.floor(weeks.length / 2)] ?? 0;
  const lower = weeks[Math.ceil(weeks.length / 2) - 1] ?? 0;
  return {
    ...group,
    findings: own.length,
    notTold: own.filter((item) => isDangerous(item) && item.ownerToldOn === null).length,
    median: cars < LEAST_CARS ? null : (lower + upper) / 2,
    longest: weeks.at(-1) ?? 0,
  };
}

function medianWords({ median }: WaitGroup): string {
  if (median === null) return 'too few cars for a middle';
  return median < 1 ? 'half under a week' : `half over ${weeksWords(median)}`;
}

function weeksWords(weeks: number): string {
  return formatCounted(Math.round(weeks), 'week', 'weeks');
}

function sentenceOf(group: WaitGroup): string {
  const middle = group.median === null ? '' : `, half of them over ${weeksWords(group.median)}`;
  return `${formatCount(group.findings)} ${group.label}: the longest ${weeksWords(group.longest)}${middle}.`;
}

const COLUMNS: readonly Column<WaitGroup>[] = [
  { key: 'group', label: 'Findings', text: ({ label }) => label },
  {
    key: 'count',
    label: 'How many',
    kind: 'number',
    text: ({ findings }) => formatCount(findings),
  },
  {
    key: 'median',
    label: 'Half over, weeks',
    kind: 'number',
    text: ({ median }) => (median === null ? 'too few cars yet' : formatCount(Math.round(median))),
    muted: ({ median }) => median === null,
  },
  {
    key: 'longest',
    label: 'Longest, weeks',
    kind: 'number',
    text: ({ longest }) => formatCount(longest),
  },
  {
    key: 'told',
    label: 'Dangerous, owner not told',
    kind: 'number',
    text: ({ key, notTold }) => (key === 'dangerous' ? formatCount(notTold) : ''),
  },
];
