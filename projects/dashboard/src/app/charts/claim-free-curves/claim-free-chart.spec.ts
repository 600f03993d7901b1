import { draw } from '../../testing/draw';
import { ClaimFreeChart } from './claim-free-chart';
import type { ClaimFreeInput } from './claim-free-input';

const data: ClaimFreeInput = {
  summary: 'After 2 months 98 % of full had no claim.',
  shareText: (share) => `${Math.round(share * 100)} %`,
  countText: String,
  curves: ['full', 'underbody', 'cavity', 'top up'].map((key, index) => ({
    key,
    label: key,
    cars: 100 - index,
    months: [
      { month: 1, atRisk: 90, share: 0.99, lower: 0.97, upper: 0.995 },
      { month: 2, atRisk: 60, share: 0.98 - index / 100, lower: 0.95, upper: 0.99 },
    ],
  })),
};

describe('ClaimFreeChart', () => {
  it('four groups drawn: each has a stroke of its own, a band and its name in words at the end and by its cars', async () => {
    const { host } = await draw(ClaimFreeChart, { data }, 660);
    expect(host.querySelector('[role=img]')?.getAttribute('aria-label')).toBe(data.summary);
    const strokes = [...host.querySelectorAll('path.curve')].map((path) =>
      path.getAttribute('class'),
    );
    expect(new Set(strokes).size).toBe(4);
    expect(host.querySelectorAll('path.band')).toHaveLength(4);
    const words = [...host.querySelectorAll('text')].map((text) =>
      text.textContent?.replace(/\s+/g, ' ').trim(),
    );
    expect(words).toContain('95 %top up');
    expect(words).toContain('cars at risk');
    expect(words.filter((word) => word === 'top up')).toHaveLength(1);
  });
});
