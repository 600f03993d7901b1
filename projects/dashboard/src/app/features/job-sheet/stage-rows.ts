import type { JobSheet } from '#shared/contracts/jobs';
import { STAGES, type Stage } from '#shared/domain/vocabulary';
import type { Column } from '../../ui/data-table/column';
import { formatMinutes, formatSignedMinutes } from '../../ui/format';
import { STAGE_NAMES } from '../../ui/words';
import { totalMinutes } from './sheet-sentence';

/** Labour of one stage; the estimate is `null` where the job had none. */
export interface StageRow {
  readonly stage: Stage;
  readonly estimate: number | null;
  readonly actual: number;
  readonly over: number | null;
}

/** The seven stages in working order. */
export function stageRows(job: JobSheet): readonly StageRow[] {
  const estimated = totalMinutes(job).estimate !== undefined;
  return STAGES.map((stage) => {
    const actual = job.actual.stages[stage] ?? 0;
    const estimate = estimated ? (job.estimate?.stages[stage] ?? 0) : null;
    return { stage, estimate, actual, over: estimate === null ? null : actual - estimate };
  });
}

/** The columns of the stages, with their totals. */
export function stageColumns(
  job: JobSheet,
  bars: 'drawn' | 'left out',
): readonly Column<StageRow>[] {
  const total = totalMinutes(job);
  const over =
    total.estimate === undefined ? '' : formatSignedMinutes(total.actual - total.estimate);
  const columns: readonly Column<StageRow>[] = [
    { key: 'stage', label: 'Stage', text: (row) => STAGE_NAMES[row.stage], total: 'all' },
    {
      key: 'estimate',
      label: 'Estimated',
      kind: 'number',
      text: (row) => (row.estimate === null ? '' : formatMinutes(row.estimate)),
      total: total.estimate === undefined ? 'no estimate' : formatMinutes(total.estimate),
    },
    {
      key: 'actual',
      label: 'Worked',
      kind: 'number',
      strong: true,
      text: (row) => formatMinutes(row.actual),
      total: formatMinutes(total.actual),
    },
    {
      key: 'over',
      label: 'Over',
      kind: 'number',
      text: (row) => (row.over === null ? '' : formatSignedMinutes(row.over)),
      total: over,
    },
  ];
  return bars === 'drawn' ? [...columns, BAR] : columns;
}

const BAR: Column<StageRow> = {
  key: 'bar',
  label: 'Over, as a bar',
  unseenLabel: true,
  text: () => '',
  // More minutes than planned are the loss: drawn to the left of zero as losses are.
  bar: (row) => (row.over === null ? null : -row.over),
};
