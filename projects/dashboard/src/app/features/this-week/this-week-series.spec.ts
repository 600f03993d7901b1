import {
  jobRow,
  jobsAnswer,
  marginAnswer,
  marginWeek,
  weeksFromTo,
} from '../../testing/week-answers';
import { thisWeekView } from './this-week-series';
import type { WeekWords } from './week-words';

const words: WeekWords = {
  currency: 'EUR',
  today: '2026-02-02',
  branchName: (code) => code,
  packageName: (code) => code,
  productName: (code) => code,
  whose: 'this branch’s',
};

function view(cars: number, more: Parameters<typeof marginAnswer>[1] = {}) {
  const rows = Array.from({ length: cars }, (_, index) => jobRow(String(index)));
  return thisWeekView(
    {
      chart: marginAnswer(weeksFromTo('2025-W31', '2026-W05'), more),
      week: marginAnswer([marginWeek('2026-W05')], more),
      billed: jobsAnswer(rows),
      unbilled: jobsAnswer([]),
    },
    words,
  );
}

describe('thisWeekView', () => {
  it('a branch’s week: all its cars are listed and named in the CSV’s words', () => {
    const { cars, standing } = view(11);
    expect(standing.week).toBe('2026-W05');
    expect(cars.atFirst).toBe(11);
    expect(cars.csv).toBe('CSV of these 11 rows');
  });

  it('a network’s week: the 25 worst first, the rest on demand', () => {
    const { cars } = view(180);
    expect(cars.atFirst).toBe(25);
    expect(cars.rows).toHaveLength(180);
    expect(cars.csv).toBe('CSV of all 180 rows');
  });

  it('no car with estimate and norm: no bridge is drawn', () => {
    expect(view(3, { bridge: { ...marginAnswer([]).bridge, cars: 0 } }).bridge).toBeNull();
    expect(view(3).bridge).not.toBeNull();
  });
});
