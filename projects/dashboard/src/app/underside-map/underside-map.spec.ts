import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { draw } from '../testing/draw';
import type { UndersideArea } from './underside-input';
import { UndersideMap } from './underside-map';

const sill: UndersideArea = {
  zone: 'sill_outer',
  side: 'left',
  share: 0.24,
  lower: 0.19,
  upper: 0.3,
  cars: 214,
  withRot: 51,
};
const areas: readonly UndersideArea[] = [
  sill,
  { zone: 'tailgate', side: 'centre', share: 0.02, cars: 214, withRot: 4 },
  { zone: 'jacking_point', side: 'right', share: null, cars: 4 },
];

async function drawMap(width: number): Promise<ComponentFixture<UndersideMap>> {
  TestBed.configureTestingModule({ providers: [provideRouter([])] });
  const heading = 'Where the rot was';
  const finding = 'Most often in the outer sill, left: 24 %.';
  return (await draw(UndersideMap, { areas, heading, finding }, width)).fixture;
}

function press(on: Element, key: string): void {
  on.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true }));
}

describe('UndersideMap', () => {
  it('drawn, given shares, shades each place by its class and says its finding in words', async () => {
    const host = (await drawMap(906)).nativeElement as HTMLElement;
    expect(host.querySelector('figcaption')?.textContent).toContain('24 %');
    expect(host.querySelectorAll('[data-key="sill_outer/left"] path.step-4')).toHaveLength(1);
    expect(host.querySelectorAll('[data-key="tailgate/centre"] path.step-0')).toHaveLength(1);
    expect(host.querySelector('.labels')?.textContent).toContain('left side');
    expect(host.querySelector('us-underside-legend')?.textContent).toContain('each step doubles');
  });

  it('drawn, given too few cars, hatches every shape of the place and says the words, without a class', async () => {
    const host = (await drawMap(906)).nativeElement as HTMLElement;
    const points = [
      ...host.querySelectorAll<SVGPathElement>('[data-key="jacking_point/right"] path'),
    ];
    expect(points).toHaveLength(2);
    for (const point of points) {
      expect(point.style.fill).toMatch(/^url\(/);
      expect(point.getAttribute('class')).not.toMatch(/step/);
    }
    expect(host.querySelector('[data-key="jacking_point/right"]')?.getAttribute('aria-label')).toBe(
      'jacking point, right, too few cars yet, 4 cars',
    );
    expect(host.querySelector('.labels')?.textContent).toContain('too few');
  });

  it('by keyboard, given arrow keys and Enter, tells the place and hands it over', async () => {
    const fixture = await drawMap(906);
    const host = fixture.nativeElement as HTMLElement;
    const chosen: UndersideArea[] = [];
    fixture.componentInstance.chosen.subscribe((area) => chosen.push(area));
    const first = host.querySelector<SVGElement>('[role=option][tabindex="0"]')!;
    expect(first.getAttribute('data-key')).toBe('sill_outer/left');
    first.focus();
    await fixture.whenStable();
    expect([...host.querySelectorAll('.tooltip span')].map((line) => line.textContent)).toEqual([
      'sill, outer, left',
      '24\u202f% (19–30\u202f%)',
      '51 of 214 cars',
    ]);
    press(first, 'Enter');
    press(first, 'ArrowRight');
    await fixture.whenStable();
    expect(document.activeElement?.getAttribute('data-key')).toBe('tailgate/centre');
    press(document.activeElement!, 'End');
    await fixture.whenStable();
    expect(document.activeElement?.getAttribute('data-key')).toBe('jacking_point/right');
    expect(chosen).toEqual([sill]);
  });

  it('on a phone, given no room for labels, lists the highest shares below the map', async () => {
    const host = (await drawMap(296)).nativeElement as HTMLElement;
    expect(host.querySelector('.labels')?.textContent).not.toContain('%');
    const rows = [...host.querySelectorAll('.highest li')].map((row) => row.textContent);
    expect(rows[0]).toMatch(/sill, outer, left.*24/);
    expect(rows).toHaveLength(2);
  });

  it('as a table, given the same areas, has a row for each with its cars and interval', async () => {
    const fixture = await drawMap(906);
    const host = fixture.nativeElement as HTMLElement;
    host.querySelector<HTMLButtonElement>('button.us-action')!.click();
    await fixture.whenStable();
    const rows = [...host.querySelectorAll('tbody tr')].map((row) => row.textContent ?? '');
    expect(rows).toHaveLength(3);
    expect(rows[0]).toMatch(/sill, outer.*left.*214.*51.*24.*19–30/s);
    expect(rows[2]).toContain('too few cars yet');
  });
});
