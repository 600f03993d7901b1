import { textWidth } from './text-width';
import { valueAxis } from './value-axis';

const marks = [
  { value: 0.5, text: 'half' },
  { value: 1, text: 'as estimated' },
  { value: 1.5, text: 'half as long again' },
  { value: 2, text: 'twice' },
  { value: 4, text: 'four times' },
];

describe('valueAxis', () => {
  it('log: equal ratios are equal distances', () => {
    const axis = valueAxis('log', [0.5, 2], 1, marks, 0, 600);
    const [half, one, twice] = [0.5, 1, 2].map((value) => axis.place(value));
    expect(one! - half!).toBeCloseTo(twice! - one!, 6);
  });

  it('values on one side only: the reference is still on the axis', () => {
    const axis = valueAxis('linear', [1.4, 1.6], 1, marks, 0, 600);
    expect(axis.place(1)).toBeGreaterThan(0);
    expect(axis.place(1)).toBeLessThan(axis.place(1.4));
  });

  it('a group ten times the reference: drawn at the end and said to lie beyond', () => {
    const axis = valueAxis('log', [1.1, 10], 1, marks, 0, 600);
    expect(axis.place(10)).toBe(600);
    expect(axis.beyond(10)).toBe('right');
    expect(axis.beyond(1.1)).toBeNull();
    expect(axis.place(2)).toBeLessThan(450);
  });

  it('log with an interval that reaches 0 or less: drawn at the left end', () => {
    const axis = valueAxis('log', [1.1, -0.2], 1, marks, 20, 600);
    expect(axis.place(-0.2)).toBe(20);
    expect(axis.beyond(-0.2)).toBe('left');
  });

  it('words that would touch: the reference stays, others go', () => {
    const wide = valueAxis('log', [0.5, 4], 1, marks, 0, 900).marks.map(({ text }) => text);
    expect(wide).toEqual(['half', 'as estimated', 'half as long again', 'twice']);
    const narrow = valueAxis('log', [0.5, 4], 1, marks, 0, 200).marks.map(({ text }) => text);
    expect(narrow).toContain('as estimated');
    expect(narrow.length).toBeLessThan(4);
  });

  it('words of a mark near the edge: moved inside the picture, the line stays', () => {
    const { marks: placed } = valueAxis('log', [1.5, 2], 1, marks, 6, 294, 300);
    const first = placed[0]!;
    expect(first.text).toBe('as estimated');
    expect(first.wordX).toBeGreaterThan(first.x);
    expect(first.wordX).toBeGreaterThanOrEqual(textWidth('as estimated') / 2);
  });

  it('no values: an axis around the reference', () => {
    const axis = valueAxis('linear', [], 1, marks, 0, 100);
    expect(axis.place(1)).toBeCloseTo(50, 6);
  });
});
