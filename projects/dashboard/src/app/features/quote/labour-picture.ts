import type { QuoteAnswer } from '#shared/contracts/quote';
import type { BarWhiskerInput } from '../../charts/bar-whisker/bar-whisker-input';
import type { Column } from '../../ui/data-table/column';
import { formatMinutes } from '../../ui/format';
import { STAGE_NAMES } from '../../ui/words';

/** Labour of a stage, or of all, as half and four of five of the cars had it. */
export interface LabourRow {
  readonly key: string;
  readonly label: string;
  readonly p50: number | null;
  readonly p80: number | null;
}

/** Steps of an axis of hours, as a clock divides. */
const STEPS = [0.5, 1, 2, 4, 8, 16, 40];
const MOST_MARKS = 7;

/** Labour by stage as a picture and as rows; the whole last, because the stages do not add up to it. */
export function labourPicture({ labour }: Pick<QuoteAnswer, 'labour'>): {
  readonly data: BarWhiskerInput;
  readonly rows: readonly LabourRow[];
  readonly columns: readonly Column<LabourRow>[];
} {
  const rows: LabourRow[] = [
    ...labour.stages.map(({ stage, p50Minutes, p80Minutes }) => ({
      key: stage,
      label: STAGE_NAMES[stage],
      p50: p50Minutes,
      p80: p80Minutes,
    })),
    { key: 'all', label: 'the whole car', p50: labour.p50Minutes, p80: labour.p80Minutes },
  ];
  return {
    rows,
    columns: COLUMNS,
    data: {
      summary: `Labour, half of the cars and four of five: ${rows
        .map((row) => `${row.label} ${rangeWords(row)}`)
        .join('; ')}.`,
      marks: hourMarks(Math.max(0, ...rows.map(({ p80 }) => p80 ?? 0))),
      rows: rows.map((row) => ({
        key: row.key,
        label: row.label,
        value: row.p50,
        further: row.p80,
        text: rangeWords(row),
        chosen: row.key === 'all',
      })),
    },
  };
}

/** Even marks from 0 to past the longest labour, few enough to read. */
function hourMarks(minutes: number): { value: number; text: string }[] {
  const step = STEPS.find((hours) => minutes / (hours * 60) < MOST_MARKS) ?? 80;
  const count = Math.ceil(minutes / (step * 60)) + 1;
  return Array.from({ length: count }, (_, index) => ({
    value: index * step * 60,
    text: index === 0 ? '0' : formatMinutes(index * step * 60),
  }));
}

function rangeWords({ p50, p80 }: LabourRow): string {
  if (p50 === null || p80 === null) return 'not known';
  return p50 === p80 ? formatMinutes(p50) : `${formatMinutes(p50)} to ${formatMinutes(p80)}`;
}

const minutesText = (minutes: number | null): string =>
  minutes === null ? 'not known' : formatMinutes(minutes);

const COLUMNS: readonly Column<LabourRow>[] = [
  { key: 'stage', label: 'Stage', text: ({ label }) => label, strong: ({ key }) => key === 'all' },
  { key: 'half', label: 'Half within', kind: 'number', text: ({ p50 }) => minutesText(p50) },
  { key: 'most', label: '4 of 5 within', kind: 'number', text: ({ p80 }) => minutesText(p80) },
];
