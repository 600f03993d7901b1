import type { WaitDotsInput, WaitRow } from './wait-dots-input';
import { layOutWaitDots } from './wait-dots-layout';

const row = (key: string, values: readonly number[], more: Partial<WaitRow> = {}): WaitRow => ({
  key,
  label: key,
  count: String(values.length),
  dots: values.map((value) => ({ value, ringed: false })),
  median: null,
  text: 'half over 30 weeks',
  danger: false,
  ...more,
});
const input = (...rows: WaitRow[]): WaitDotsInput => ({
  summary: 'Findings wait.',
  rows,
  marks: [
    { value: 0, text: '0 weeks' },
    { value: 52, text: '1 year' },
  ],
});

describe('layOutWaitDots', () => {
  it('findings of the same week: stand on each other, none above the room of its row', () => {
    const [placed] = layOutWaitDots(input(row('a', [10, 10, 10])), 900).rows;
    expect(new Set(placed!.dots.map(({ x }) => x)).size).toBe(1);
    expect(new Set(placed!.dots.map(({ y }) => y)).size).toBe(3);
    for (const { y } of placed!.dots) {
      expect(y).toBeLessThan(placed!.base);
      expect(y).toBeGreaterThan(placed!.top);
    }
  });

  it('a very high stack: pressed together, still within its row', () => {
    const [placed] = layOutWaitDots(input(row('a', Array<number>(200).fill(4))), 900).rows;
    expect(placed!.base - placed!.top).toBeLessThan(110);
    expect(Math.min(...placed!.dots.map(({ y }) => y))).toBeGreaterThanOrEqual(placed!.top);
  });

  it('ringed marks: lie lowest in their stack', () => {
    const dots = [false, true, false].map((ringed) => ({ value: 10, ringed }));
    const [placed] = layOutWaitDots(input(row('a', [], { dots })), 900).rows;
    const lowest = placed!.dots.reduce((low, dot) => (dot.y > low.y ? dot : low));
    expect(lowest.ringed).toBe(true);
  });

  it('a phone: words stand over the marks, which take the whole width', () => {
    const layout = layOutWaitDots(input(row('a', [1, 60]), row('b', [2])), 296);
    expect(layout.stacked).toBe(true);
    expect(layout.right - layout.left).toBeGreaterThan(270);
    for (const { wordY, top } of layout.rows) expect(wordY).toBeLessThan(top);
  });

  it('rows: follow each other without overlap, inside the picture', () => {
    const layout = layOutWaitDots(input(row('a', [1, 1, 60]), row('b', [2])), 900);
    expect(layout.rows[1]!.top).toBeGreaterThan(layout.rows[0]!.base);
    expect(layout.height).toBeGreaterThan(layout.rows[1]!.base);
  });
});
