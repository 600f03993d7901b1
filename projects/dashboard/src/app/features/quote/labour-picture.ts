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

const HOURS = [0, 1, 2, 4, 6, 8, 10, 12, 16, 20, 30, 40];

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
      marks: HOURS.map((hours) => ({ value: hours * 60, text: hours === 0 ? '0' : `${hours} h` })),
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
