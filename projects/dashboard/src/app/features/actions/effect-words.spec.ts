import { effectOf } from '../../testing/action-answers';
import { formatDate } from '../../ui/format';
import { effectPicture } from './effect-picture';
import { tellEffect } from './effect-words';

const AGREED = { agreedOn: '2025-11-03', endedOn: null };
const side = effectOf().after;
const said = (parts: readonly unknown[]): string =>
  parts
    .map((part) => (typeof part === 'string' ? part : Object.values(part as object)[0]))
    .join('')
    .replaceAll('\u202f', ' ');
const tell = (more: Parameters<typeof effectOf>[0] = {}) => {
  const { sentence, second } = tellEffect(AGREED, effectOf(more), 'Havnsund', '2026-02-02');
  return { sentence: said(sentence), second: said(second) };
};

describe('tellEffect', () => {
  it('a change that chance does not explain, says how much, give or take, and over how many cars', () => {
    const { sentence, second } = tell();
    expect(sentence).toBe(
      `Since ${formatDate('2025-11-03')} Havnsund overran 6 points less than in the 26 weeks before (give or take 4; 240 cars before, 118 cars since), allowing for the cars.`,
    );
    expect(second).toContain('more than chance explains');
    expect(second).toContain('does not say that the action alone did it');
  });

  it('a change whose interval holds zero, says that it may be none', () => {
    expect(tell({ change: -0.02, lower: -0.06, upper: 0.02 }).second).toContain(
      'may be no change at all',
    );
  });

  it('a change upwards, says more', () => {
    expect(tell({ measure: 'margin', change: 0.03, lower: 0.01, upper: 0.05 }).sentence).toContain(
      'Havnsund kept 3 points more of what it billed than',
    );
  });

  it('claims, are told per 1,000 car-years, with how late they come', () => {
    const { sentence, second } = tell({ measure: 'claims', change: -2.1, lower: -4, upper: -0.2 });
    expect(sentence).toContain('had 2.1 per 1,000 car-years fewer claims');
    expect(second).toContain('Claims come months after the work');
  });

  it('too few cars since, says how many it takes and about when', () => {
    const after = { ...side, cars: 2, value: null, lower: null, upper: null };
    const { sentence, second } = tell({ after, change: null, lower: null, upper: null });
    expect(sentence).toBe('What it did to overrun cannot be told yet.');
    expect(second).toContain('Only 2 cars that count have been finished');
    // 182 days brought 240 cars, so three more take three days.
    expect(second).toContain(formatDate('2026-02-05'));
  });

  it('too few cars before, says that there is nothing to compare with', () => {
    const before = { ...effectOf().before, cars: 3, value: null, lower: null, upper: null };
    expect(tell({ before, change: null, lower: null, upper: null }).second).toContain(
      'nothing to compare with',
    );
  });
});

describe('effectPicture', () => {
  it('both sides known, draws them with their intervals and a tick each for what is expected', () => {
    const { input, rows } = effectPicture(effectOf())!;
    expect(input.rows.map(({ value, tick }) => [value, tick])).toEqual([
      [1.24, 1.18],
      [1.17, 1.17],
    ]);
    expect(input.reference).toBeNull();
    expect(input.marks.length).toBeLessThanOrEqual(5);
    expect(rows.map((row) => row.side)).toEqual(['before', 'since']);
    expect(input.summary.replaceAll('\u202f', ' ')).toContain('where +18 % is expected');
  });

  it('one side too few, hatches it with the words', () => {
    const after = { ...side, cars: 2, value: null, lower: null, upper: null };
    const row = effectPicture(effectOf({ after }))!.input.rows[1]!;
    expect([row.value, row.tick, row.text]).toEqual([null, null, 'too few cars yet']);
  });

  it('neither side known, draws nothing', () => {
    const none = { ...side, cars: 2, value: null, lower: null, upper: null };
    expect(effectPicture(effectOf({ before: none, after: none }))).toBeUndefined();
  });
});
