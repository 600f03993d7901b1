import { draw } from '../../testing/draw';
import { AgeRegionChart } from './age-region-chart';
import type { AgeRegionInput } from './age-region-input';

const data: AgeRegionInput = {
  summary: 'Outer Coast 58 %, Inland Hills too few.',
  rows: [
    { key: '10-14', label: '10–14', chosen: true },
    { key: '20+', label: '20+', chosen: false },
  ],
  panels: [
    {
      key: 'OC',
      name: 'Outer Coast',
      air: 'air C4, 62 µm a year',
      cells: [
        { cars: 74, count: '74', share: 0.58, lower: 0.47, upper: 0.69 },
        { cars: 2, count: '2', share: null, lower: null, upper: null },
      ],
      adjusted: '33 %',
      adjustedRange: '(27–40 %)',
      adjustedNote: 'without 0–4',
    },
  ],
  references: [0.36, null],
  referenceWord: 'network',
};

describe('AgeRegionChart', () => {
  it('drawn: dot, interval and reference of the chosen age, hatching and words for too few, all words beside', async () => {
    const { host } = await draw(AgeRegionChart, { data }, 600);
    const picture = host.querySelector('[role=img]')!;
    expect(picture.getAttribute('aria-label')).toBe(data.summary);
    const [chosen, few] = [...picture.querySelectorAll('g')];
    expect(chosen!.classList).toContain('chosen');
    expect(chosen!.querySelectorAll('circle.dot, line.interval, line.reference')).toHaveLength(3);
    expect(few!.querySelector('rect[fill^="url(#"]')).not.toBeNull();
    expect(few!.querySelector('circle')).toBeNull();
    expect(few!.textContent).toContain('too few');
    for (const words of [
      'Outer Coast',
      'air C4, 62 µm a year',
      '33 %',
      '(27–40 %)',
      'without 0–4',
    ]) {
      expect(picture.textContent).toContain(words);
    }
    expect(host.querySelector('.key')?.textContent).toContain('network');
  });
});
