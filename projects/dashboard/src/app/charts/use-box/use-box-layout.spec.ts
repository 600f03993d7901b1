import type { UseBoxInput, UseBoxRow } from './use-box-input';
import { layOutUseBox, useBoxHeight } from './use-box-layout';

function row(key: string, quantiles: readonly number[] | null, more: Partial<UseBoxRow> = {}) {
  const [p10 = 0, p25 = 0, median = 0, p75 = 0, p90 = 0] = quantiles ?? [];
  return {
    key,
    label: key,
    count: '120',
    spread: quantiles && { p10, p25, median, p75, p90 },
    under: '18 % under',
    over: '4 % over',
    strong: false,
    text: quantiles ? '' : 'too few cars yet',
    ...more,
  };
}

const input: UseBoxInput = {
  summary: 'Full hatchbacks got 94 % of the norm.',
  groups: [
    {
      key: 'full',
      label: 'full',
      rows: [row('hatchback', [0.6, 0.8, 0.94, 1.02, 1.2]), row('van', null)],
    },
    { key: 'cavity', label: 'cavity', rows: [row('estate', [0, 0.7, 0.9, 1.1, 6])] },
  ],
  marks: [
    { value: 0.7, text: '70 %' },
    { value: 1, text: 'norm' },
    { value: 1.3, text: '130 %' },
  ],
  limits: [0.7, 1.3],
};

describe('layOutUseBox', () => {
  it.each([296, 420, 732])('%d px wide: the quantiles stand in order inside the plot', (width) => {
    const picture = layOutUseBox(input, width);
    const { p10, p25, median, p75, p90 } = picture.rows[0]!.box!;
    const places = [picture.left, p10, p25, median, p75, p90, picture.right];
    expect([...places].sort((a, b) => a - b)).toEqual(places);
    expect(median).toBeLessThan(picture.norm);
    expect(p90).toBeGreaterThan(picture.norm);
  });

  it('under and over: as far from the norm as their ratio says, both marked', () => {
    const { marks, norm } = layOutUseBox(input, 732);
    const [low, , high] = marks.map(({ x }) => Math.abs(x - norm));
    expect(marks.map(({ text }) => text)).toEqual(['70 %', 'norm', '130 %']);
    expect(low! / high!).toBeCloseTo(Math.log(1 / 0.7) / Math.log(1.3), 6);
  });

  it('cars without any, cars with six times the norm: drawn to the ends and marked', () => {
    const picture = layOutUseBox(input, 732);
    const far = picture.rows[2]!;
    expect(far.beyond).toEqual({ left: true, right: true });
    expect(far.box!.p10).toBe(picture.left);
    expect(far.box!.p90).toBe(picture.right);
    expect(picture.rows[0]!.beyond).toEqual({ left: false, right: false });
  });

  it('too few cars: no box', () => {
    expect(layOutUseBox(input, 732).rows[1]!.box).toBeNull();
  });

  it('a phone: each plot under its words and as wide as the picture', () => {
    const picture = layOutUseBox(input, 296);
    expect(picture.stacked).toBe(true);
    expect(picture.right - picture.left).toBeGreaterThan(280);
    expect(picture.rows.every(({ y, wordY }) => y > wordY)).toBe(true);
  });

  it('wide: as high as the place kept for it', () => {
    const picture = layOutUseBox(input, 732);
    expect(picture.stacked).toBe(false);
    expect(picture.height).toBe(useBoxHeight(input));
    expect(picture.headings.map(({ label }) => label)).toEqual(['full', 'cavity']);
  });

  it('no groups: an empty picture', () => {
    expect(layOutUseBox({ ...input, groups: [] }, 600).rows).toEqual([]);
  });
});
