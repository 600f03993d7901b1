import { draw } from '../../testing/draw';
import { DotIntervalChart } from './dot-interval-chart';
import type { DotIntervalInput } from './dot-interval-input';

const data: DotIntervalInput = {
  summary: 'Strip took 40 % longer than estimated.',
  scale: 'log',
  reference: 1,
  marks: [{ value: 1, text: 'as estimated' }],
  rows: [
    {
      key: 's',
      label: 'strip',
      count: '34',
      value: 1.4,
      lower: 1.2,
      upper: 1.6,
      text: '+40 %',
      stand: 'above',
      word: 'above',
      chosen: false,
    },
    {
      key: 'c',
      label: 'clean',
      count: '34',
      value: 1,
      lower: 0.9,
      upper: 1.1,
      text: '0 %',
      stand: 'as_expected',
      word: '',
      chosen: true,
    },
    {
      key: 'd',
      label: 'dry',
      count: '3',
      value: null,
      lower: null,
      upper: null,
      text: 'too few cars yet',
      stand: 'as_expected',
      word: '',
      chosen: false,
    },
  ],
};

describe('DotIntervalChart', () => {
  it('drawn: a miss has a triangle and its word, a hit a dot, too few cars hatching with count and words', async () => {
    const { host } = await draw(DotIntervalChart, { data }, 600);
    expect(host.querySelector('[role=img]')?.getAttribute('aria-label')).toBe(data.summary);
    const [miss, hit, few] = [...host.querySelectorAll('g:not([us-value-marks])')];
    expect(miss!.querySelector('path.miss')).not.toBeNull();
    expect(miss!.textContent).toContain('+40 % above');
    expect(hit!.querySelector('circle.dot.chosen')).not.toBeNull();
    expect(few!.querySelector('rect[fill^="url(#"]')).not.toBeNull();
    expect(few!.textContent).toContain('too few cars yet');
    expect(few!.textContent).toContain('3');
    expect(few!.querySelector('circle, path')).toBeNull();
  });
});
