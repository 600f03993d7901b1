import { draw } from '../../testing/draw';
import { UseBoxChart } from './use-box-chart';
import type { UseBoxInput } from './use-box-input';

const data: UseBoxInput = {
  summary: 'Full hatchbacks: 18 % of 120 cars under 70 % of the norm.',
  marks: [{ value: 1, text: 'norm' }],
  limits: [0.7, 1.3],
  groups: [
    {
      key: 'full',
      label: 'full',
      rows: [
        {
          key: 'hatchback',
          label: 'hatchback',
          count: '120',
          spread: { p10: 0.6, p25: 0.8, median: 0.94, p75: 1.02, p90: 1.2 },
          under: '18 % under',
          over: '',
          strong: true,
          text: '',
        },
        {
          key: 'few',
          label: '3 others',
          count: '7',
          spread: null,
          under: '',
          over: '',
          strong: false,
          text: 'too few cars yet',
        },
      ],
    },
  ],
};

describe('UseBoxChart', () => {
  it('drawn: box, norm and words of a row; too few cars as hatching with the words', async () => {
    const { host } = await draw(UseBoxChart, { data }, 700);
    expect(host.querySelector('[role=img]')?.getAttribute('aria-label')).toBe(data.summary);
    const [full, few] = [...host.querySelectorAll('g:not([us-value-marks])')];
    expect(full!.querySelector('rect.half')).not.toBeNull();
    expect(full!.querySelector('line.norm')).not.toBeNull();
    expect(full!.querySelector('text.oxide')?.textContent).toContain('18 % under');
    expect(few!.querySelector('rect.half')).toBeNull();
    expect(few!.querySelector('rect[fill^="url(#"]')).not.toBeNull();
    expect(few!.textContent).toContain('too few cars yet');
  });
});
