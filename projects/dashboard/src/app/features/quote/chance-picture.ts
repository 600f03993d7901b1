import type { QuoteAnswer } from '#shared/contracts/quote';
import type { DotIntervalInput, IntervalRow } from '../../charts/dot-interval/dot-interval-input';
import type { Column } from '../../ui/data-table/column';
import { formatCount, formatShare, formatShareRange } from '../../ui/format';

/** A chance with its interval and what it was counted from. */
export interface ChanceRow {
  readonly key: string;
  readonly label: string;
  readonly some: number;
  readonly all: number;
  readonly share: number | null;
  readonly lower: number | null;
  readonly upper: number | null;
}

/** What may turn up underneath: rot at all, and a bubble that is a hole once worked. */
export function chancePicture({ rot, openedUp }: Pick<QuoteAnswer, 'rot' | 'openedUp'>): {
  readonly data: DotIntervalInput;
  readonly rows: readonly ChanceRow[];
  readonly columns: readonly Column<ChanceRow>[];
} {
  const rows: ChanceRow[] = [
    { key: 'rot', label: 'rot is found', some: rot.withRot, all: rot.cars, ...intervalOf(rot) },
    {
      key: 'opened',
      label: 'a bubble is a hole',
      some: openedUp.holed,
      all: openedUp.worked,
      ...intervalOf(openedUp),
    },
  ];
  return {
    rows,
    columns: COLUMNS,
    data: {
      summary: `${rows.map(chanceWords).join('; ')}.`,
      scale: 'linear',
      reference: 0,
      marks: [0, 0.25, 0.5, 0.75, 1].map((share) => ({ value: share, text: formatShare(share) })),
      rows: rows.map(intervalRow),
    },
  };
}

function intervalOf({ share, lower, upper }: Pick<ChanceRow, 'share' | 'lower' | 'upper'>) {
  return { share, lower, upper };
}

function intervalRow(row: ChanceRow): IntervalRow {
  const { key, label, share, lower, upper } = row;
  return {
    ...{ key, label, lower, upper, value: share },
    count: `${formatCount(row.some)} of ${formatCount(row.all)}`,
    text: share === null ? 'too few yet' : formatShare(share),
    stand: 'as_expected',
    word: '',
    chosen: key === 'rot',
  };
}

function chanceWords({ label, share, lower, upper, some, all }: ChanceRow): string {
  const counted = `${formatCount(some)} of ${formatCount(all)}`;
  return share === null || lower === null || upper === null
    ? `${label}: too few yet, ${counted}`
    : `${label}: ${formatShare(share)}, ${formatShareRange(lower, upper)}, ${counted}`;
}

const COLUMNS: readonly Column<ChanceRow>[] = [
  { key: 'what', label: 'Chance that', text: ({ label }) => label },
  {
    key: 'of',
    label: 'Seen',
    kind: 'number',
    text: ({ some, all }) => `${formatCount(some)} of ${formatCount(all)}`,
  },
  {
    key: 'share',
    label: 'Share',
    kind: 'number',
    text: ({ share }) => (share === null ? 'too few yet' : formatShare(share)),
    muted: ({ share }) => share === null,
  },
  {
    key: 'interval',
    label: '95 %',
    kind: 'number',
    text: ({ lower, upper }) =>
      lower === null || upper === null ? '' : formatShareRange(lower, upper),
  },
];
