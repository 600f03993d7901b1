import type { QuantileStripInput, StripRow } from './quantile-strip-input';
import { layOutQuantileStrip } from './quantile-strip-layout';

function row(key: string, quantiles: [number, number, number] | null): StripRow {
  const [median, p80, p95] = quantiles ?? [null, null, null];
  const text = quantiles ? '+40 %' : 'too few cars yet';
  return { key, label: key, count: '20', median, p80, p95, text, chosen: false };
}

const input: QuantileStripInput = {
  summary: '8 of 10 within 40 % more.',
  rows: [row('full', [1.1, 1.4, 1.9]), row('cavity', null), row('underbody', [0.9, 1, 9])],
  scale: 'log',
  reference: 1,
  marks: [{ value: 1, text: 'as estimated' }],
};

describe('layOutQuantileStrip', () => {
  it.each([296, 400, 600])(
    '%d px wide: half, 8 of 10 and 19 of 20 in order inside the plot',
    (width) => {
      const picture = layOutQuantileStrip(input, width);
      const { median, p80, p95 } = picture.rows[0]!.strip!;
      expect(median).toBeLessThan(p80);
      expect(p80).toBeLessThan(p95);
      expect(median).toBeGreaterThanOrEqual(picture.left);
      expect(p95).toBeLessThanOrEqual(picture.right);
    },
  );

  it('too few cars: no strip', () => {
    expect(layOutQuantileStrip(input, 600).rows[1]!.strip).toBeNull();
  });

  it('a last twentieth far off: drawn to the end and marked', () => {
    const picture = layOutQuantileStrip(input, 600);
    expect(picture.rows[2]!.beyond).toBe(true);
    expect(picture.rows[2]!.strip!.p95).toBe(picture.right);
    expect(picture.rows[0]!.beyond).toBe(false);
  });
});
