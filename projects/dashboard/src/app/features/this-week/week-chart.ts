import type { MarginAnswer, MarginWeek } from '#shared/contracts/margin';
import type {
  MarginMark,
  MarginPoint,
  WeeklyMarginInput,
} from '../../charts/weekly-margin/weekly-margin-input';
import type { Column } from '../../ui/data-table/column';
import {
  formatAmount,
  formatCars,
  formatCount,
  formatList,
  formatNumber,
  formatShare,
  formatShareRange,
  formatSignedAmount,
  formatWeek,
  formatWeekNumber,
} from '../../ui/format';
import { formatTarget } from '../../ui/measure-words';
import { countRunning } from './week-standing';
import { ordinal, pValue } from './week-words';

/** The weekly picture: what is drawn, its method in one breath, and the same weeks as a table. */
export interface WeekChart {
  readonly input: WeeklyMarginInput;
  readonly note: string;
  readonly columns: readonly Column<MarginWeek>[];
  readonly rows: readonly MarginWeek[];
}

/** Turns the margin answer into the weekly chart; `week` is the one the page speaks of. */
export function weekChart(chart: MarginAnswer, week: string): WeekChart {
  return {
    input: {
      summary: summarise(chart, week),
      points: chart.weeks.map((figures, index) => pointOf(chart, figures, index)),
      limits: chart.limits,
      target: chart.targetMarginShare,
      chosen: week,
    },
    note: [limitsNote(chart), targetNote(chart), trendNote(chart)].filter(Boolean).join(' '),
    columns: weekColumns(chart),
    rows: [...chart.weeks].reverse(),
  };
}

function pointOf(chart: MarginAnswer, figures: MarginWeek, index: number): MarginPoint {
  const { week, marginShare: share } = figures;
  return {
    week,
    share,
    mark: markOf(figures),
    flag: flagOf(chart, figures, index),
    lines: [formatWeek(week), valueLine(chart, figures), carsLine(figures)],
  };
}

function markOf({ signal, whole, marginShare }: MarginWeek): MarginMark {
  if (!whole && marginShare !== null) return 'partial';
  if (signal === 'outside_low' || signal === 'outside_high') return 'outside';
  return signal ?? 'plain';
}

/** The sentence beside a mark; a run is named once, at its first marked week. */
function flagOf(
  chart: MarginAnswer,
  { week, signal, marginShare }: MarginWeek,
  index: number,
): string | null {
  switch (signal) {
    case 'outside_low':
      return `${formatWeekNumber(week)}: below, ${formatShare(marginShare ?? 0)}`;
    case 'outside_high':
      return `${formatWeekNumber(week)}: above, ${formatShare(marginShare ?? 0)}`;
    case 'run_low':
    case 'run_high':
      return runIsNamed(chart, index)
        ? null
        : `${formatWeekNumber(week)}: ${runWords(chart, week, signal)}`;
    case null:
      return null;
  }
}

/** Whether an earlier week of the run that the week at `index` belongs to is marked as a run. */
function runIsNamed(chart: MarginAnswer, index: number): boolean {
  const signal = chart.weeks[index]!.signal;
  const judged = chart.weeks.slice(0, index).filter((one) => one.marginShare !== null && one.whole);
  const running = countRunning(chart, chart.weeks[index]!.week);
  return judged.slice(judged.length - (running - 1)).some((one) => one.signal === signal);
}

function runWords(chart: MarginAnswer, week: string, signal: 'run_low' | 'run_high'): string {
  const side = signal === 'run_low' ? 'below' : 'above';
  return `${ordinal(countRunning(chart, week))} in a row ${side} centre`;
}

function valueLine(chart: MarginAnswer, { week, marginShare, signal, whole }: MarginWeek): string {
  if (marginShare === null) return 'nothing billed';
  const share = formatShare(marginShare);
  if (!whole) return `${share} so far`;
  if (!chart.limits) return share;
  switch (signal) {
    case 'outside_low':
      return `${share}, below limits`;
    case 'outside_high':
      return `${share}, above limits`;
    case 'run_low':
    case 'run_high':
      return `${share}, ${runWords(chart, week, signal)}`;
    case null:
      return `${share}, inside limits`;
  }
}

function carsLine({ jobs, unbilled }: MarginWeek): string {
  if (jobs === 0) return 'no cars';
  return unbilled > 0 ? `${formatCars(jobs)}, ${formatCount(unbilled)} unbilled` : formatCars(jobs);
}

function limitsNote({ limits }: MarginAnswer): string {
  if (!limits) return 'No limits yet: they take 8 earlier billed weeks.';
  return `Centre and limits from the ${formatCount(limits.baselineWeeks)} billed weeks before.`;
}

/** A target is what is wanted, limits are what the work has been: said wherever both are drawn. */
function targetNote({ targetMarginShare }: MarginAnswer): string {
  return targetMarginShare === null ? '' : 'Dotted: the target, what is wanted; it moves no limit.';
}

function trendNote({ trend }: MarginAnswer): string {
  if (!trend) return '';
  if (trend.p >= 0.05) return `No trend (${pValue(trend.p)})`;
  const pointsPerWeek = formatNumber(Math.abs(trend.slopePerWeek) * 100, 1);
  const way = trend.slopePerWeek < 0 ? 'Falling' : 'Rising';
  return `${way} ${pointsPerWeek} points a week (${pValue(trend.p)})`;
}

/** What the picture shows, for those who do not see it. */
function summarise(chart: MarginAnswer, week: string): string {
  const chosen = chart.weeks.find((one) => one.week === week);
  const said = [`Margin of ${formatCount(chart.weeks.length)} weeks up to ${formatWeek(week)}.`];
  if (chosen)
    said.push(`${formatWeekNumber(week)}: ${valueLine(chart, chosen)}, ${carsLine(chosen)}.`);
  if (chart.targetMarginShare !== null) {
    said.push(`Target ${formatTarget('margin', chart.targetMarginShare)}.`);
  }
  if (chart.limits) {
    const { lower, centre, upper } = chart.limits;
    said.push(`Limits ${formatShareRange(lower, upper)}, centre ${formatShare(centre)}.`);
    const marked = chart.weeks.filter(({ signal }) => signal !== null);
    said.push(
      marked.length === 0
        ? 'No week is outside them and no run is longer than 7 weeks.'
        : `Marked: ${formatList(marked.map((one) => `${formatWeek(one.week)} ${valueLine(chart, one)}`))}.`,
    );
  } else {
    said.push('No limits are known yet.');
  }
  return said.join(' ');
}

function weekColumns(chart: MarginAnswer): Column<MarginWeek>[] {
  return [
    {
      key: 'week',
      label: 'Week',
      text: ({ week }) => formatWeek(week),
      sortBy: ({ week }) => week,
    },
    {
      key: 'jobs',
      label: 'Cars',
      kind: 'number',
      text: ({ jobs }) => formatCount(jobs),
      sortBy: ({ jobs }) => jobs,
    },
    {
      key: 'unbilled',
      label: 'Unbilled',
      kind: 'number',
      text: ({ unbilled }) => formatCount(unbilled),
      sortBy: ({ unbilled }) => unbilled,
    },
    {
      key: 'revenue',
      label: 'Billed',
      kind: 'number',
      text: ({ revenueCents }) => formatAmount(revenueCents),
      sortBy: ({ revenueCents }) => revenueCents,
    },
    {
      key: 'margin',
      label: 'Kept',
      kind: 'number',
      text: ({ marginCents }) => formatAmount(marginCents),
      sortBy: ({ marginCents }) => marginCents,
    },
    {
      key: 'share',
      label: '%',
      kind: 'number',
      text: ({ marginShare }) => (marginShare === null ? '' : formatShare(marginShare)),
      sortBy: ({ marginShare }) => marginShare,
    },
    ...(chart.targetMarginShare === null ? [] : [againstTarget(chart.targetMarginShare)]),
    {
      key: 'signal',
      label: 'Stands',
      text: (figures) =>
        figures.marginShare === null ? 'nothing billed' : stand(valueLine(chart, figures)),
    },
  ];
}

function againstTarget(target: number): Column<MarginWeek> {
  return {
    key: 'target',
    label: `Against target ${formatTarget('margin', target)}`,
    kind: 'number',
    text: ({ marginShare }) =>
      marginShare === null ? '' : `${formatSignedAmount((marginShare - target) * 10_000)} points`,
    sortBy: ({ marginShare }) => (marginShare === null ? null : marginShare - target),
  };
}

/** The word after the share: "below limits". */
function stand(line: string): string {
  return line.includes(', ') ? line.slice(line.indexOf(', ') + 2) : line.replace(/^\S+\s*/, '');
}
