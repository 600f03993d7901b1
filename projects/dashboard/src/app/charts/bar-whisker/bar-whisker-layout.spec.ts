import { layOutBarWhisker } from './bar-whisker-layout';

const row = (key: string, value: number | null, further: number | null) => ({
  key,
  label: key,
  value,
  further,
  text: '2 h to 3 h',
  chosen: false,
});
const input = {
  summary: 'Strip takes 2 to 3 hours.',
  rows: [row('strip', 120, 180), row('dry', 0, 0), row('none', null, null)],
  marks: [
    { value: 0, text: '0' },
    { value: 120, text: '2 h' },
  ],
};

describe('layOutBarWhisker', () => {
  it('a bar: begins at 0, its whisker goes on beyond it, inside the plot', () => {
    const picture = layOutBarWhisker(input, 600);
    const { bar } = picture.rows[0]!;
    expect(bar!.end).toBeGreaterThan(picture.reference);
    expect(bar!.further).toBeGreaterThan(bar!.end);
    expect(bar!.further).toBeLessThanOrEqual(picture.right);
  });

  it('a stage that takes no time: a bar of no length', () => {
    const picture = layOutBarWhisker(input, 600);
    expect(picture.rows[1]!.bar!.end).toBeCloseTo(picture.reference);
  });

  it('nothing known: no bar', () => {
    expect(layOutBarWhisker(input, 600).rows[2]!.bar).toBeNull();
  });
});
