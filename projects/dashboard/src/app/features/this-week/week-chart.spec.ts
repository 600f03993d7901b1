import { marginAnswer, marginWeek, weeksFromTo } from '../../testing/week-answers';
import { weekChart } from './week-chart';

const plain = (text: string): string => text.replaceAll('\u202f', ' ');

describe('weekChart', () => {
  const weeks = weeksFromTo('2025-W31', '2026-W05', (week, index) =>
    marginWeek(week, { marginShare: 0.387 + ((index % 2) - 0.5) / 50 }),
  );
  weeks[15] = marginWeek('2025-W46', {
    marginShare: 0.292,
    signal: 'outside_low',
    jobs: 9,
    unbilled: 1,
  });
  const chart = marginAnswer(weeks);

  it('every week is a point; the week outside has its shape and sentence', () => {
    const { input } = weekChart(chart, '2026-W05');
    expect(input.points).toHaveLength(27);
    expect(input.chosen).toBe('2026-W05');
    const below = input.points[15]!;
    expect(below.mark).toBe('outside');
    expect(plain(below.flag!)).toBe('Week 46: below, 29 %');
    expect(below.lines.map(plain)).toEqual([
      'Week 46, 2025',
      '29 %, below limits',
      '9 cars, 1 unbilled',
    ]);
  });

  it('an ordinary week: a dot without a sentence, three lines to read', () => {
    const point = weekChart(chart, '2026-W05').input.points[0]!;
    expect(point).toMatchObject({ mark: 'plain', flag: null });
    expect(point.lines.map(plain)).toEqual(['Week 31, 2025', '38 %, inside limits', '11 cars']);
  });

  it('a run: named once, where it became one', () => {
    const run = weeksFromTo('2025-W31', '2026-W05', (week, index) =>
      marginWeek(week, {
        marginShare: index < 10 ? 0.4 : 0.36,
        signal: index >= 17 ? 'run_low' : null,
      }),
    );
    const { points } = weekChart(marginAnswer(run), '2026-W05').input;
    expect(points.filter(({ mark }) => mark === 'run_low')).toHaveLength(10);
    expect(points.flatMap(({ flag }) => flag ?? [])).toEqual([
      'Week 48: 8th in a row below centre',
    ]);
    expect(plain(points.at(-1)!.lines[1]!)).toBe('36 %, 17th in a row below centre');
  });

  it('a week outside within a run: the run goes on and is not named again', () => {
    const run = weeksFromTo('2025-W31', '2026-W05', (week, index) =>
      marginWeek(week, {
        marginShare: index === 20 ? 0.1 : 0.36,
        signal: index === 20 ? 'outside_low' : index >= 7 ? 'run_low' : null,
      }),
    );
    const flags = weekChart(marginAnswer(run), '2026-W05').input.points.flatMap(
      ({ flag }) => flag ?? [],
    );
    expect(flags.map(plain)).toEqual([
      'Week 38: 8th in a row below centre',
      'Week 51: below, 10 %',
    ]);
  });

  it('a second run after the side has changed: named too', () => {
    const runs = weeksFromTo('2025-W31', '2026-W05', (week, index) =>
      marginWeek(week, {
        marginShare: index < 10 ? 0.36 : 0.42,
        signal:
          index < 7 || (index >= 10 && index < 17) ? null : index < 10 ? 'run_low' : 'run_high',
      }),
    );
    const flags = weekChart(marginAnswer(runs), '2026-W05').input.points.flatMap(
      ({ flag }) => flag ?? [],
    );
    expect(flags).toEqual([
      'Week 38: 8th in a row below centre',
      'Week 48: 8th in a row above centre',
    ]);
  });

  it('nothing billed: a gap that says so', () => {
    const gap = marginWeek('2026-W04', { jobs: 0, marginShare: null, revenueCents: 0 });
    const point = weekChart(marginAnswer([gap]), '2026-W04').input.points[0]!;
    expect(point).toMatchObject({ share: null, mark: 'plain', flag: null });
    expect(point.lines).toEqual(['Week 4, 2026', 'nothing billed', 'no cars']);
  });

  it('a week that is not over: partial and so far', () => {
    const running = marginWeek('2026-W06', { whole: false });
    const point = weekChart(marginAnswer([running]), '2026-W06').input.points[0]!;
    expect(point.mark).toBe('partial');
    expect(plain(point.lines[1]!)).toBe('36 % so far');
  });

  it.each([
    [
      { slopePerWeek: 0.001, p: 0.7 },
      'Centre and limits from the 26 billed weeks before. No trend (p = 0.7)',
    ],
    [
      { slopePerWeek: -0.004, p: 0.01 },
      'Centre and limits from the 26 billed weeks before. Falling 0.4 points a week (p = 0.01)',
    ],
    [null, 'Centre and limits from the 26 billed weeks before.'],
  ])('trend %j: %s', (trend, note) => {
    expect(weekChart(marginAnswer(weeks, { trend }), '2026-W05').note).toBe(note);
  });

  it('no limits: the note says what they take, the weeks are not judged', () => {
    const view = weekChart(marginAnswer(weeks, { limits: null, trend: null }), '2026-W05');
    expect(view.note).toBe('No limits yet: they take 8 earlier billed weeks.');
    expect(plain(view.input.points[0]!.lines[1]!)).toBe('38 %');
    expect(view.input.summary).toContain('No limits are known yet.');
  });

  it('the text alternative: the chosen week, the limits, and every marked week', () => {
    expect(plain(weekChart(chart, '2026-W05').input.summary)).toBe(
      'Margin of 27 weeks up to Week 5, 2026. Week 5: 38 %, inside limits, 11 cars. Limits 31–46 %, centre 39 %. Marked: Week 46, 2025 29 %, below limits.',
    );
  });

  it('the twin: the same weeks, newest first', () => {
    const { rows, columns } = weekChart(chart, '2026-W05');
    expect(rows.map(({ week }) => week)).toEqual(weeks.map(({ week }) => week).reverse());
    const stands = columns.find(({ key }) => key === 'signal')!;
    expect(stands.text(weeks[15]!)).toBe('below limits');
    expect(stands.text(weeks[0]!)).toBe('inside limits');
  });

  it('a target: a line of its own, said in the note, the text alternative and the twin; limits as they were', () => {
    const view = weekChart(marginAnswer(weeks, { targetMarginShare: 0.4 }), '2026-W05');
    expect(view.input.target).toBe(0.4);
    expect(view.input.limits).toEqual(weekChart(chart, '2026-W05').input.limits);
    expect(view.note).toContain('Dotted: the target, what is wanted; it moves no limit.');
    expect(plain(view.input.summary)).toContain('Target 40 %.');
    const against = view.columns.find(({ key }) => key === 'target')!;
    expect(plain(against.label)).toBe('Against target 40 %');
    expect(against.text(weeks[15]!)).toMatch(/^\u2212\d+ points$/);
  });

  it('no target: no line, no column and no word of one', () => {
    const view = weekChart(chart, '2026-W05');
    expect(view.input.target).toBeNull();
    expect(view.columns.some(({ key }) => key === 'target')).toBe(false);
    expect(view.note).not.toContain('target');
  });
});
