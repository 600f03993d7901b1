import { ChangeDetectionStrategy, Component, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import type { Problem } from '../../core/api/problem';
import { LoadState } from './load-state';

@Component({
  changeDetection: ChangeDetectionStrategy.OnPush,
  imports: [LoadState],
  template: `
    <us-load-state [of]="reading" [empty]="empty()">
      <p usEmpty>Nothing yet</p>
      <p class="rows">Rows</p>
    </us-load-state>
  `,
})
class Host {
  readonly empty = signal(false);
  readonly value = signal<unknown>(undefined);
  readonly problem = signal<Problem | undefined>(undefined);
  readonly refreshing = signal(false);
  reloads = 0;
  readonly reading = {
    value: this.value,
    loading: signal(false),
    refreshing: this.refreshing,
    problem: this.problem,
    reload: () => (this.reloads += 1),
  };
}

async function shown(prepare: (host: Host) => void) {
  const fixture = TestBed.createComponent(Host);
  prepare(fixture.componentInstance);
  await fixture.whenStable();
  return { host: fixture.componentInstance, element: fixture.nativeElement as HTMLElement };
}

describe('LoadState', () => {
  it('without a value says that it is loading and shows no rows', async () => {
    const { element } = await shown(() => undefined);
    expect(element.querySelector('[role=status]')?.textContent).toContain('Loading');
    expect(element.textContent).not.toContain('Rows');
  });

  it('with a value shows it', async () => {
    const { element } = await shown((host) => host.value.set([]));
    expect(element.querySelector('.rows')).not.toBeNull();
    expect(element.textContent).not.toContain('Nothing yet');
  });

  it('with nothing in the value says why and shows no rows', async () => {
    const { element } = await shown((host) => {
      host.value.set([]);
      host.empty.set(true);
    });
    expect(element.textContent).toContain('Nothing yet');
    expect(element.querySelector('.rows')).toBeNull();
  });

  it('with a problem says it aloud and offers another try', async () => {
    const { host, element } = await shown((h) =>
      h.problem.set({ status: 0, sentence: 'No answer from the server.', fields: [] }),
    );
    expect(element.querySelector('[role=alert]')?.textContent).toContain('No answer');
    element.querySelector('button')?.click();
    expect(host.reloads).toBe(1);
  });

  it('while a newer answer is under way keeps the rows and marks them busy', async () => {
    const { element } = await shown((host) => {
      host.value.set([]);
      host.refreshing.set(true);
    });
    expect(element.querySelector('.ready')?.getAttribute('aria-busy')).toBe('true');
    expect(element.querySelector('.rows')).not.toBeNull();
  });
});
