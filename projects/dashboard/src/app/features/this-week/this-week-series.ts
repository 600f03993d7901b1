import type { JobRow } from '#shared/contracts/job-list';
import type { Column } from '../../ui/data-table/column';
import { currencySign, formatCount } from '../../ui/format';
import { answerWeek, type WeekAnswer } from './week-answer';
import { weekBridge, type WeekBridge } from './week-bridge';
import { weekCarColumns, weekCarsNote } from './week-cars';
import { weekChart, type WeekChart } from './week-chart';
import { standingOf, type Standing, type WeekAnswers } from './week-standing';
import type { WeekWords } from './week-words';

/** Cars listed before the rest is asked for. */
const CARS_AT_FIRST = 25;

/** Everything the page shows of a week, ready to be drawn. */
export interface ThisWeekView {
  readonly standing: Standing;
  readonly answer: WeekAnswer;
  /** Null where no week of it has a car. */
  readonly chart: WeekChart | null;
  /** Absent where no billed car has an estimate and a norm. */
  readonly bridge: WeekBridge | null;
  readonly cars: {
    readonly heading: string;
    readonly note: string;
    readonly columns: readonly Column<JobRow>[];
    readonly rows: readonly JobRow[];
    /** Rows to show before the rest is asked for. */
    readonly atFirst: number;
    readonly csv: string;
  };
}

/** Turns the answers of one week into the page's answer, pictures and rows. Pure. */
export function thisWeekView(answers: WeekAnswers, words: WeekWords): ThisWeekView {
  const standing = standingOf(answers, words.today);
  const rows = answers.billed.items;
  const { bridge } = answers.week;
  const atFirst = rows.length > CARS_AT_FIRST + 5 ? CARS_AT_FIRST : rows.length;
  return {
    standing,
    answer: answerWeek(answers, standing, words),
    chart: answers.chart.weeks.some(({ jobs }) => jobs > 0)
      ? weekChart(answers.chart, standing.week)
      : null,
    bridge: bridge.cars > 0 ? weekBridge(bridge, standing.cars, words.currency) : null,
    cars: {
      heading: 'The cars that made the week, worst first',
      note: weekCarsNote(answers, standing, currencySign(words.currency)),
      columns: weekCarColumns(answers, standing, words),
      rows,
      atFirst,
      csv: csvWords(answers.billed.jobs, atFirst),
    },
  };
}

function csvWords(cars: number, shown: number): string {
  if (cars === 1) return 'CSV of this row';
  return `CSV of ${cars > shown ? 'all' : 'these'} ${formatCount(cars)} rows`;
}
