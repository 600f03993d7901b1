import { draw } from '../../testing/draw';
import type { MarginPoint, WeeklyMarginInput } from './weekly-margin-input';
import { WeeklyMarginChart } from './weekly-margin-chart';

function point(week: string, share: number | null, more: Partial<MarginPoint> = {}): MarginPoint {
  return { week, share, mark: 'plain', flag: null, lines: [week, 'second', 'third'], ...more };
}

const input: WeeklyMarginInput = {
  summary: 'Weekly margin: week 5 kept 36 %, inside the limits.',
  points: [
    point('2026-W01', 0.38),
    point('2026-W02', 0.292, { mark: 'outside', flag: 'Week 2: below, 29 %' }),
    point('2026-W03', null),
    point('2026-W04', 0.39, { mark: 'run_high', flag: 'Week 4: 8th above the centre' }),
    point('2026-W05', 0.363),
  ],
  limits: { centre: 0.387, lower: 0.309, upper: 0.464 },
  target: null,
  chosen: '2026-W05',
};

async function drawWeeks(data: WeeklyMarginInput) {
  const { fixture, host } = await draw(WeeklyMarginChart, { data }, 640);
  const chosen: string[] = [];
  fixture.componentInstance.choose.subscribe((week) => chosen.push(week));
  const list = host.querySelector<HTMLElement>('[role=listbox]')!;
  const press = async (key: string): Promise<void> => {
    list.dispatchEvent(new KeyboardEvent('keydown', { key, cancelable: true }));
    await fixture.whenStable();
  };
  const tooltip = (): string | undefined => host.querySelector('.tooltip span')?.textContent;
  return { fixture, host, list, press, tooltip, chosen };
}

describe('WeeklyMarginChart', () => {
  it('drawn: an image with its finding as text alternative, and a list of all weeks', async () => {
    const { host } = await drawWeeks(input);
    expect(host.querySelector('svg')?.getAttribute('role')).toBe('img');
    expect(host.querySelector('svg')?.getAttribute('aria-label')).toBe(input.summary);
    const options = [...host.querySelectorAll('[role=option]')];
    expect(options.map((option) => option.getAttribute('aria-label'))).toEqual(
      input.points.map(({ lines }) => lines.join('. ')),
    );
    expect(options.map((option) => option.getAttribute('aria-selected'))).toEqual([
      'false',
      'false',
      'false',
      'false',
      'true',
    ]);
  });

  it('marked weeks: a shape of their own and their sentence, plain ones a dot', async () => {
    const { host } = await drawWeeks(input);
    expect(host.querySelectorAll('path.outside')).toHaveLength(2);
    expect([...host.querySelectorAll('.flag')].map((flag) => flag.textContent.trim())).toEqual([
      'Week 2: below, 29 %',
      'Week 4: 8th above the centre',
    ]);
    expect(host.querySelectorAll('circle.point')).toHaveLength(1);
    expect(host.querySelectorAll('circle.ring')).toHaveLength(1);
  });

  it('focus: starts at the chosen week and shows its three lines', async () => {
    const { list, host, fixture } = await drawWeeks(input);
    list.dispatchEvent(new FocusEvent('focus'));
    await fixture.whenStable();
    const lines = [...host.querySelectorAll('.tooltip span')].map((line) => line.textContent);
    expect(lines).toEqual(['2026-W05', 'second', 'third']);
    expect(list.getAttribute('aria-activedescendant')).toBe(
      host.querySelector('[aria-selected=true]')?.id,
    );
  });

  it('arrow keys: move week by week and stop at the ends', async () => {
    const { list, press, tooltip, fixture } = await drawWeeks(input);
    list.dispatchEvent(new FocusEvent('focus'));
    await fixture.whenStable();
    await press('ArrowLeft');
    expect(tooltip()).toBe('2026-W04');
    await press('Home');
    await press('ArrowLeft');
    expect(tooltip()).toBe('2026-W01');
    await press('ArrowRight');
    expect(tooltip()).toBe('2026-W02');
    await press('End');
    await press('ArrowRight');
    expect(tooltip()).toBe('2026-W05');
  });

  it('Enter: chooses the week that is read, a gap included; Escape takes the tooltip away', async () => {
    const { list, press, tooltip, chosen, fixture } = await drawWeeks(input);
    list.dispatchEvent(new FocusEvent('focus'));
    await fixture.whenStable();
    await press('ArrowLeft');
    await press('ArrowLeft');
    await press('Enter');
    expect(chosen).toEqual(['2026-W03']);
    await press('Escape');
    expect(tooltip()).toBeUndefined();
    await press('Enter');
    expect(chosen).toEqual(['2026-W03']);
  });

  it('pointer: the nearest week is read, and chosen by a click', async () => {
    const { list, tooltip, chosen, fixture } = await drawWeeks(input);
    const move = new MouseEvent('pointermove', { bubbles: true });
    Object.defineProperty(move, 'offsetX', { value: 5 });
    list.dispatchEvent(move);
    await fixture.whenStable();
    expect(tooltip()).toBe('2026-W01');
    list.click();
    expect(chosen).toEqual(['2026-W01']);
    list.dispatchEvent(new MouseEvent('pointerleave'));
    await fixture.whenStable();
    expect(tooltip()).toBeUndefined();
  });

  it('keys that mean nothing here: left to the page', async () => {
    const { list } = await drawWeeks(input);
    const event = new KeyboardEvent('keydown', { key: 'Tab', cancelable: true });
    list.dispatchEvent(event);
    expect(event.defaultPrevented).toBe(false);
  });
});
