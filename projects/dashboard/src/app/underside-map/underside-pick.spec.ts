import { TestBed, type ComponentFixture } from '@angular/core/testing';
import type { UndersidePlace } from './underside-input';
import { UndersidePick } from './underside-pick';

async function draw(place: UndersidePlace | null = null): Promise<ComponentFixture<UndersidePick>> {
  jest
    .spyOn(Element.prototype, 'getBoundingClientRect')
    .mockReturnValue({ left: 0, top: 0, width: 328, height: 128 } as DOMRect);
  const fixture = TestBed.createComponent(UndersidePick);
  fixture.componentRef.setInput('heading', 'Third finding');
  fixture.componentRef.setInput('place', place);
  await fixture.whenStable();
  return fixture;
}

const hostOf = (fixture: ComponentFixture<UndersidePick>): HTMLElement =>
  fixture.nativeElement as HTMLElement;
const offered = (host: HTMLElement): HTMLButtonElement[] => [
  ...host.querySelectorAll<HTMLButtonElement>('button.offer'),
];
const labelled = (host: HTMLElement, name: string): HTMLElement & { click(): void } =>
  host.querySelector<HTMLElement>(`[aria-label="${name}"]`)!;

/** A finger on the car, in the drawing's units. */
async function touch(
  fixture: ComponentFixture<UndersidePick>,
  x: number,
  y: number,
  pointerType: 'touch' | 'mouse' = 'touch',
): Promise<void> {
  const at = { clientX: (x * 328) / 1000, clientY: (y * 128) / 390, detail: 1, bubbles: true };
  const click = Object.assign(new MouseEvent('click', at), { pointerType });
  const host = hostOf(fixture);
  // jsdom knows no geometry, so the pointer's zone is named: the outer sill where a mouse points, none for a finger.
  const under = pointerType === 'mouse' ? '[data-key="sill_outer/left"]' : 'us-underside-car svg';
  host.querySelector(under)!.dispatchEvent(click);
  await fixture.whenStable();
}

describe('UndersidePick', () => {
  afterEach(() => jest.restoreAllMocks());

  it('touched, given several zones in reach, rings the touch and asks for one in words, nearest first', async () => {
    const fixture = await draw();
    await touch(fixture, 500, 36);
    const host = hostOf(fixture);
    expect(host.querySelector('circle.ring')?.getAttribute('r')).toBe('23');
    expect(host.querySelector('[aria-live]')?.textContent).toBe(
      'Third finding, left side: which zone?',
    );
    expect(offered(host).map((button) => button.textContent?.trim())).toEqual([
      'sill, outer',
      'sill, inner',
      'door bottom',
      'floor',
      'chassis rail',
    ]);
    expect(fixture.componentInstance.place()).toBeNull();
  });

  it('touched and answered, given the words of a zone, fills it in both', async () => {
    const fixture = await draw();
    await touch(fixture, 500, 36);
    const host = hostOf(fixture);
    offered(host)[1]!.click();
    await fixture.whenStable();
    expect(fixture.componentInstance.place()).toEqual({ zone: 'sill_inner', side: 'left' });
    expect(offered(host)[1]!.getAttribute('aria-pressed')).toBe('true');
    expect(host.querySelectorAll('path.chosen')).toHaveLength(1);
    expect(labelled(host, 'sill, inner, left').getAttribute('aria-checked')).toBe('true');
  });

  it('told of another finding, given a touch before, rings and asks nothing until it is touched again', async () => {
    const fixture = await draw();
    await touch(fixture, 500, 36);
    expect(fixture.componentInstance.asks()).toBe(true);
    fixture.componentInstance.forgetTouch();
    await fixture.whenStable();
    expect(fixture.componentInstance.asks()).toBe(false);
    expect(hostOf(fixture).querySelector('circle.ring')).toBeNull();
    expect(offered(hostOf(fixture))).toEqual([]);
  });

  it('clicked, given a mouse that points at one zone, takes it and still offers its neighbours', async () => {
    const fixture = await draw();
    await touch(fixture, 500, 36, 'mouse');
    expect(fixture.componentInstance.place()).toEqual({ zone: 'sill_outer', side: 'left' });
    expect(offered(hostOf(fixture)).length).toBeGreaterThan(1);
  });

  it('touched, given a single zone in reach, takes it', async () => {
    const fixture = await draw();
    await touch(fixture, -30, 195);
    expect(fixture.componentInstance.place()).toEqual({ zone: 'slam_panel', side: 'centre' });
  });

  it('touched, given nothing in reach, says so and keeps no place', async () => {
    const fixture = await draw({ zone: 'floor', side: 'left' });
    await touch(fixture, -200, -200);
    expect(fixture.componentInstance.place()).toBeNull();
    expect(hostOf(fixture).querySelector('[aria-live]')?.textContent).toContain(
      'nothing within reach',
    );
  });

  it('by keyboard, given arrow keys, moves among 25 named zones and picks with Space', async () => {
    const fixture = await draw();
    const host = hostOf(fixture);
    const zones = host.querySelectorAll('[role=radiogroup] [role=radio]');
    expect(zones).toHaveLength(25);
    expect(host.querySelectorAll('[role=radio][tabindex="0"]')).toHaveLength(1);
    (zones[0] as SVGElement).focus();
    for (const key of ['ArrowRight', 'ArrowDown', 'ArrowLeft', ' ']) {
      document.activeElement!.dispatchEvent(
        new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true }),
      );
      await fixture.whenStable();
    }
    expect(document.activeElement?.getAttribute('aria-label')).toBe('front arch, left');
    expect(fixture.componentInstance.place()).toEqual({ zone: 'front_arch', side: 'left' });
  });

  it('picked, given a zone on the middle, asks where on it', async () => {
    const fixture = await draw({ zone: 'boot_floor', side: 'centre' });
    const host = hostOf(fixture);
    const [left] = [...host.querySelectorAll<HTMLButtonElement>('.sides button')];
    left!.click();
    await fixture.whenStable();
    expect(fixture.componentInstance.place()).toEqual({ zone: 'boot_floor', side: 'left' });
    expect(host.querySelectorAll('path.chosen')).toHaveLength(1);
    const sided = await draw({ zone: 'sill_outer', side: 'left' });
    expect(hostOf(sided).querySelector('.sides')).toBeNull();
  });

  it('as a list, given every zone and side, is the same control', async () => {
    const fixture = await draw({ zone: 'sill_outer', side: 'left' });
    const host = hostOf(fixture);
    host.querySelector<HTMLButtonElement>('button.us-action')!.click();
    await fixture.whenStable();
    const radios = [...host.querySelectorAll<HTMLInputElement>('input[type=radio]')];
    expect(radios).toHaveLength(45);
    expect(new Set(radios.map(({ name }) => name)).size).toBe(1);
    expect(radios.find(({ checked }) => checked)?.getAttribute('aria-label')).toBe(
      'sill, outer, left',
    );
    labelled(host, 'floor, centre').click();
    await fixture.whenStable();
    expect(fixture.componentInstance.place()).toEqual({ zone: 'floor', side: 'centre' });
    host.querySelector<HTMLButtonElement>('button.us-action')!.click();
    await fixture.whenStable();
    expect(labelled(host, 'floor, centre').getAttribute('aria-checked')).toBe('true');
  });
});
