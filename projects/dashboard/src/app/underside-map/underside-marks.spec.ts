import { draw } from '../testing/draw';
import type { UndersideFinding } from './underside-input';
import { UndersideMarks } from './underside-marks';

const findings: readonly UndersideFinding[] = [
  {
    ref: 'a',
    zone: 'sill_inner',
    side: 'left',
    seenAs: 'bubbling',
    workedAs: 'holed',
    structural: true,
    action: 'patched',
  },
  {
    ref: 'b',
    zone: 'rear_arch',
    side: 'right',
    seenAs: 'holed',
    structural: true,
    action: 'deferred',
  },
];

async function drawMarks(list: 'beside' | 'none'): Promise<HTMLElement> {
  return (await draw(UndersideMarks, { findings, list }, 1000)).host;
}

describe('UndersideMarks', () => {
  it('drawn, given two findings, numbers them on the car and in words, the danger with its word', async () => {
    const host = await drawMarks('beside');
    const numbers = [...host.querySelectorAll('us-underside-marks-layer text')];
    expect(numbers.map((number) => number.textContent?.trim())).toEqual(['1', '2']);
    expect(host.querySelectorAll('us-underside-marks-layer .danger')).toHaveLength(1);
    const [first, second] = [...host.querySelectorAll('li')].map((row) => row.textContent ?? '');
    expect(first).toMatch(/1.*sill, inner, left.*seen as bubbling, worked as holed, patched/s);
    expect(first).not.toContain('Danger');
    expect(second).toMatch(/2.*rear arch, right.*load-bearing.*deferred.*Danger: left on the car/s);
    expect(host.querySelector('[role=img]')?.getAttribute('aria-label')).toBe(
      'Findings on the car, seen from below: 1 sill, inner, left; 2 rear arch, right.',
    );
  });

  it('drawn, given a page with a list of its own, shows the car alone', async () => {
    const host = await drawMarks('none');
    expect(host.querySelector('ol')).toBeNull();
    expect(host.querySelectorAll('us-underside-marks-layer text')).toHaveLength(2);
  });
});
