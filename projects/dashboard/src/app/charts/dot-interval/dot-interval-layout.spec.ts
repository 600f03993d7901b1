import type { DotIntervalInput, IntervalRow } from './dot-interval-input';
import { layOutDotInterval } from './dot-interval-layout';

function row(key: string, value: number | null, more: Partial<IntervalRow> = {}): IntervalRow {
  return {
    key,
    label: key,
    count: '34',
    value,
    lower: value === null ? null : value - 0.1,
    upper: value === null ? null : value + 0.1,
    text: value === null ? 'too few cars yet' : `+${Math.round((value - 1) * 100)} %`,
    stand: 'as_expected',
    word: '',
    chosen: false,
    ...more,
  };
}

const input: DotIntervalInput = {
  summary: 'Strip took longest.',
  rows: [
    row('strip', 1.4, { stand: 'above', word: 'above' }),
    row('clean', 1.02),
    row('dry', null),
  ],
  scale: 'log',
  reference: 1,
  marks: [
    { value: 1, text: 'as estimated' },
    { value: 2, text: 'twice' },
  ],
};

describe('layOutDotInterval', () => {
  it('a group: the dot lies inside its interval, the interval in the plot', () => {
    const picture = layOutDotInterval(input, 600);
    for (const { dot } of picture.rows) {
      if (!dot) continue;
      expect(dot.from).toBeLessThan(dot.x);
      expect(dot.x).toBeLessThan(dot.to);
      expect(dot.from).toBeGreaterThanOrEqual(picture.left);
      expect(dot.to).toBeLessThanOrEqual(picture.right);
    }
  });

  it('too few cars: no dot', () => {
    expect(layOutDotInterval(input, 600).rows[2]!.dot).toBeNull();
  });

  it('a value without an interval: the dot alone', () => {
    const rows = [row('strip', 1.4, { lower: null, upper: null })];
    const { dot } = layOutDotInterval({ ...input, rows }, 600).rows[0]!;
    expect(dot!.from).toBe(dot!.x);
    expect(dot!.to).toBe(dot!.x);
  });

  it('an interval that runs off the axis: its end is named', () => {
    const rows = [row('repair', 9, { lower: 7, upper: 11 }), row('strip', 1.1)];
    const picture = layOutDotInterval({ ...input, rows }, 600);
    expect(picture.rows[0]!.beyond).toBe('right');
    expect(picture.rows[0]!.dot!.to).toBe(picture.right);
    expect(picture.rows[0]!.dot!.x).toBe(picture.right - 16);
    expect(picture.rows[1]!.beyond).toBeNull();
  });

  it('a phone: plots move under their words and take the whole width', () => {
    const picture = layOutDotInterval(input, 280);
    expect(picture.stacked).toBe(true);
    expect(picture.rows[0]!.y).toBeGreaterThan(picture.rows[0]!.wordY);
    expect(picture.right - picture.left).toBeGreaterThan(260);
  });

  it('a phone and long words: the cars stand on a line of their own, between words and plot', () => {
    const rows = [row('product under 70 % of the norm', 1.4, { count: '1,191 of 26,432' })];
    const [placed] = layOutDotInterval({ ...input, rows }, 280).rows;
    expect(placed!.countY).toBeGreaterThan(placed!.wordY);
    expect(placed!.y).toBeGreaterThan(placed!.countY + 10);
  });

  it('an axis told to reach further: what else would lie beyond it does not', () => {
    const rows = [row('voids', 4, { lower: 3.5, upper: 4.5 })];
    expect(layOutDotInterval({ ...input, rows }, 600).rows[0]!.beyond).toBe('right');
    expect(layOutDotInterval({ ...input, rows, reach: 5 }, 600).rows[0]!.beyond).toBeNull();
  });

  it('wide: words and plot on one line', () => {
    const picture = layOutDotInterval(input, 600);
    expect(picture.stacked).toBe(false);
    expect(picture.rows[0]!.y).toBe(picture.rows[0]!.wordY);
  });

  it('a ledger: a hairline between every two rows, none otherwise', () => {
    const { rules, rows } = layOutDotInterval({ ...input, look: 'ledger' }, 600);
    expect(rules).toHaveLength(2);
    expect(rules[0]).toBeGreaterThan(rows[0]!.y);
    expect(rules[0]).toBeLessThan(rows[1]!.y);
    expect(layOutDotInterval(input, 600).rules).toEqual([]);
  });

  it('no groups: an empty picture', () => {
    expect(layOutDotInterval({ ...input, rows: [] }, 600).rows).toEqual([]);
  });

  it('rows with ticks of their own and no shared reference: a tick each on the axis, no line through all', () => {
    const rows = [row('before', 1.24, { tick: 1.1 }), row('after', 1.16, { tick: null })];
    const picture = layOutDotInterval(
      { ...input, rows, scale: 'linear', reference: null, marks: [] },
      600,
    );
    expect(picture.reference).toBeNull();
    expect(picture.rows[0]!.tick).toBeGreaterThanOrEqual(picture.left);
    expect(picture.rows[0]!.tick).toBeLessThan(picture.rows[0]!.dot!.x);
    expect(picture.rows[1]!.tick).toBeNull();
  });
});
