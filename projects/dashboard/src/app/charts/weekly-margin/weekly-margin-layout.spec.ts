import { textWidth } from '../text-width';
import type { MarginPoint, WeeklyMarginInput } from './weekly-margin-input';
import { layOutWeeklyMargin } from './weekly-margin-layout';

function point(week: string, share: number | null, more: Partial<MarginPoint> = {}): MarginPoint {
  return { week, share, mark: 'plain', flag: null, lines: [`Week ${week}`], ...more };
}

const input: WeeklyMarginInput = {
  summary: 'Week 5 kept 36 %.',
  points: [
    ...Array.from({ length: 22 }, (_, index) =>
      point(`2025-W${31 + index}`, 0.38 + (index % 3) / 50),
    ),
    point('2026-W01', null),
    point('2026-W02', 0.292, { mark: 'outside', flag: 'Week 2: below, 29 %' }),
    point('2026-W03', 0.4),
    point('2026-W04', 0.39),
    point('2026-W05', 0.363),
  ],
  limits: { centre: 0.387, lower: 0.309, upper: 0.464 },
  target: null,
  chosen: '2026-W05',
};

describe('layOutWeeklyMargin', () => {
  it.each([320, 360, 480, 600, 732, 900])('%d px wide: nothing leaves the picture', (width) => {
    const picture = layOutWeeklyMargin(input, width);
    expect(picture.left).toBeGreaterThan(0);
    for (const { x, y } of picture.weeks) {
      expect(x).toBeGreaterThanOrEqual(picture.left);
      expect(x).toBeLessThanOrEqual(picture.right);
      if (y !== null) {
        expect(y).toBeGreaterThanOrEqual(picture.top);
        expect(y).toBeLessThanOrEqual(picture.bottom);
      }
    }
    for (const { value, word } of picture.labels) {
      const end = picture.right + 11 + textWidth(`${value} ${word}`);
      expect(end).toBeLessThanOrEqual(width + 1);
    }
  });

  it.each([320, 732])('%d px wide: labels at the right end keep 19 px apart', (width) => {
    const heights = layOutWeeklyMargin(input, width)
      .labels.map(({ y }) => y)
      .sort((a, b) => a - b);
    for (let i = 1; i < heights.length; i++) {
      expect(heights[i]! - heights[i - 1]!).toBeGreaterThanOrEqual(19 - 1e-9);
    }
  });

  it('the line breaks at a week without billed cars', () => {
    const { join } = layOutWeeklyMargin(input, 732);
    expect(join.match(/M/g)).toHaveLength(2);
  });

  it('a week cut by the period is drawn but not joined', () => {
    const points = [...input.points, point('2026-W06', 0.5, { mark: 'partial' })];
    const { join, weeks } = layOutWeeklyMargin({ ...input, points }, 732);
    expect(weeks.at(-1)?.y).not.toBeNull();
    expect(join.split(/[ML]/)).toHaveLength(1 + input.points.length - 1);
  });

  it('higher shares stand higher, and limits enclose the centre', () => {
    const { limits, weeks } = layOutWeeklyMargin(input, 732);
    expect(limits!.upper).toBeLessThan(limits!.centre);
    expect(limits!.centre).toBeLessThan(limits!.lower);
    const low = weeks.find(({ week }) => week === '2026-W02')!;
    expect(low.y!).toBeGreaterThan(limits!.lower);
  });

  it('the chosen week is labelled at the right end and known to its mark', () => {
    const picture = layOutWeeklyMargin(input, 732);
    expect(picture.labels).toContainEqual(
      expect.objectContaining({ value: '36', word: 'Week 5', role: 'chosen' }),
    );
    expect(picture.weeks.filter(({ chosen }) => chosen).map(({ week }) => week)).toEqual([
      '2026-W05',
    ]);
  });

  it('a chosen week without billed cars has no label', () => {
    const picture = layOutWeeklyMargin({ ...input, chosen: '2026-W01' }, 732);
    expect(picture.labels.some(({ role }) => role === 'chosen')).toBe(false);
    expect(picture.weeks.find(({ chosen }) => chosen)?.y).toBeNull();
  });

  it('an axis that does not start at 0 says where it starts, clear of the years', () => {
    const wide = layOutWeeklyMargin(input, 732);
    expect(wide.start?.text).toBe('axis starts at 26\u202f%');
    expect(wide.start?.y).toBe(wide.bottom + 38);
    const narrow = layOutWeeklyMargin(input, 320);
    expect(narrow.start!.y).toBeGreaterThan(wide.start!.y);
    expect(narrow.height).toBeGreaterThan(narrow.start!.y);
  });

  it('an axis from 0 says nothing of it', () => {
    const points = [point('2026-W04', 0.02), point('2026-W05', 0.08)];
    expect(layOutWeeklyMargin({ ...input, points, limits: null }, 732).start).toBeNull();
  });

  it('limits not known: no band, the points stay', () => {
    const picture = layOutWeeklyMargin({ ...input, limits: null }, 732);
    expect(picture.limits).toBeNull();
    expect(picture.labels.map(({ role }) => role)).toEqual(['chosen']);
    expect(picture.weeks).toHaveLength(27);
  });

  it('a target is a labelled line of its own', () => {
    const picture = layOutWeeklyMargin({ ...input, target: 0.4 }, 732);
    expect(picture.target).not.toBeNull();
    expect(picture.labels).toContainEqual(
      expect.objectContaining({ value: '40', word: 'target', role: 'target' }),
    );
  });

  it('a loss is written with a true minus', () => {
    const points = [point('2026-W04', 0.1), point('2026-W05', -0.3)];
    const { labels } = layOutWeeklyMargin({ ...input, points, limits: null }, 732);
    expect(labels[0]?.value).toBe('−30');
  });

  it('no weeks give an empty picture without error', () => {
    expect(layOutWeeklyMargin({ ...input, points: [], limits: null }, 400).weeks).toEqual([]);
  });
});
