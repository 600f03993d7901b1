import { draw } from '../../testing/draw';
import { UseByTemperatureChart } from './use-by-temperature-chart';
import type { UseByTemperatureInput } from './use-by-temperature-input';

const data: UseByTemperatureInput = {
  summary: '41 ml less for every degree warmer.',
  tick: String,
  classes: [
    { fromC: 5, toC: 10, count: '3', quartiles: null },
    { fromC: 10, toC: 15, count: '40', quartiles: { p25: 3800, median: 4000, p75: 4300 } },
  ],
};

describe('UseByTemperatureChart', () => {
  it('drawn: a bar with its median and cars, too few cars as hatching with their count', async () => {
    const { host } = await draw(UseByTemperatureChart, { data }, 400);
    expect(host.querySelector('[role=img]')?.getAttribute('aria-label')).toBe(data.summary);
    const [few, many] = [...host.querySelectorAll('g:not([us-height-ticks])')];
    expect(few!.querySelector('rect[fill^="url(#"]')).not.toBeNull();
    expect(few!.textContent).toContain('3');
    expect(many!.querySelector('rect.half')).not.toBeNull();
    expect(many!.querySelector('line.median')).not.toBeNull();
    expect(many!.textContent).toContain('40');
  });
});
