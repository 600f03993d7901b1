import { draw } from '../../testing/draw';
import { QuantileStripChart } from './quantile-strip-chart';
import type { QuantileStripInput } from './quantile-strip-input';

const data: QuantileStripInput = {
  summary: '8 of 10 full treatments were done within 40 % more than estimated.',
  scale: 'log',
  reference: 1,
  marks: [{ value: 1, text: 'as estimated' }],
  rows: [
    {
      key: 'f',
      label: 'full',
      count: '34',
      median: 1.1,
      p80: 1.4,
      p95: 1.9,
      text: '+40 %',
      chosen: false,
    },
    {
      key: 'c',
      label: 'cavity',
      count: '3',
      median: null,
      p80: null,
      p95: null,
      text: 'too few cars yet',
      chosen: false,
    },
  ],
};

describe('QuantileStripChart', () => {
  it('drawn: a strip with its figure, too few cars as hatching with the words', async () => {
    const { host } = await draw(QuantileStripChart, { data }, 600);
    expect(host.querySelector('[role=img]')?.getAttribute('aria-label')).toBe(data.summary);
    const [full, few] = [...host.querySelectorAll('g:not([us-value-marks])')];
    expect(full!.querySelector('rect.most')).not.toBeNull();
    expect(full!.textContent).toContain('+40 %');
    expect(few!.querySelector('rect.most')).toBeNull();
    expect(few!.textContent).toContain('too few cars yet');
  });
});
