import { TestBed } from '@angular/core/testing';
import { Progress } from './progress';

async function shown(inputs: Record<string, unknown>): Promise<HTMLElement> {
  const fixture = TestBed.createComponent(Progress);
  for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

describe('Progress', () => {
  it('part-way says how far and draws the bead that long', async () => {
    const element = await shown({ label: 'Reading the file', done: 30, of: 120 });
    const bar = element.querySelector('[role=progressbar]');
    expect(bar?.getAttribute('aria-valuenow')).toBe('30');
    expect(bar?.getAttribute('aria-valuemax')).toBe('120');
    expect(element.querySelector<HTMLElement>('us-bead')?.style.width).toBe('25%');
  });

  it('with steps has a tick for each to come and none for those done', async () => {
    const element = await shown({ label: 'Steps', done: 4, of: 6, steps: 'shown' });
    expect(element.querySelectorAll('.tick')).toHaveLength(1);
  });

  it('of nothing draws no bead and divides by nothing', async () => {
    const element = await shown({ label: 'Nothing', done: 0, of: 0 });
    expect(element.querySelector('us-bead')).toBeNull();
  });
});
