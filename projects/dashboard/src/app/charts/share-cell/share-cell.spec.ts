import { TestBed } from '@angular/core/testing';
import { ShareCell, type ShareCellInput } from './share-cell';

async function drawn(more: Partial<ShareCellInput> = {}) {
  const fixture = TestBed.createComponent(ShareCell);
  const data = { counted: 0.6, steadied: 0.5, lower: 0.4, upper: 0.7, all: 0.42, ...more };
  fixture.componentRef.setInput('data', data);
  fixture.componentRef.setInput('end', 0.8);
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}
const x = (host: HTMLElement, mark: string, name: string) =>
  Number(host.querySelector(mark)?.getAttribute(name));

describe('ShareCell', () => {
  it('a share: dot between the ends of its interval, all to its left, and not heard', async () => {
    const host = await drawn();
    expect(x(host, '.interval', 'x1')).toBeLessThan(x(host, '.dot', 'cx'));
    expect(x(host, '.dot', 'cx')).toBeLessThan(x(host, '.interval', 'x2'));
    expect(x(host, '.all', 'x1')).toBeLessThan(x(host, '.dot', 'cx'));
    expect(host.querySelector('svg')?.getAttribute('aria-hidden')).toBe('true');
    expect(host.querySelector('.counted')).not.toBeNull();
  });

  it('too few cars: no diamond', async () => {
    expect((await drawn({ counted: null })).querySelector('.counted')).toBeNull();
  });

  it('nothing known of all: no line', async () => {
    expect((await drawn({ all: null })).querySelector('.all')).toBeNull();
  });
});
