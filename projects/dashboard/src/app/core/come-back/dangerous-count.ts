import { afterNextRender, computed, inject, Injectable, signal } from '@angular/core';
import { listComeBack } from '#shared/contracts/come-back';
import { Api } from '../api/api';
import { Session } from '../session/session';

/** How many dangerous findings are still on cars, for the header; asked for once a sign-in, after the first paint, and again when a mark is set. */
@Injectable({ providedIn: 'root' })
export class DangerousCount {
  private readonly session = inject(Session);
  private readonly painted = signal(false);
  private readonly reading = inject(Api).read(listComeBack, () =>
    this.painted() && this.reads() ? { query: { limit: 1 } } : undefined,
  );

  /** Whether the role has the list at all. */
  readonly reads = computed(() => {
    const role = this.session.role();
    return role !== undefined && role !== 'recorder';
  });
  /** `undefined` until known, and where it could not be asked for. */
  readonly dangerous = computed(() => this.reading.value()?.dangerous);

  constructor() {
    // A timer of no length runs after the frame is on the screen; the page's own calls go first.
    afterNextRender(() => setTimeout(() => this.painted.set(true)));
  }

  reload(): void {
    if (this.reads()) this.reading.reload();
  }
}
