import { computed, DestroyRef, DOCUMENT, inject, Injectable, signal } from '@angular/core';

/** Whether there is a line to the server, as far as this device knows: what the browser says, and whether the last call was answered. */
@Injectable({ providedIn: 'root' })
export class Line {
  private readonly connected = signal(navigator.onLine);
  private readonly answered = signal(true);
  private readonly returned = signal(0);

  readonly down = computed(() => !this.connected() || !this.answered());
  /** Counts the times that the browser said the line is back; a call may be tried at once. */
  readonly returns = this.returned.asReadonly();

  constructor() {
    const view = inject(DOCUMENT).defaultView;
    const back = (): void => {
      this.connected.set(true);
      this.returned.update((times) => times + 1);
    };
    const gone = (): void => this.connected.set(false);
    view?.addEventListener('online', back);
    view?.addEventListener('offline', gone);
    inject(DestroyRef).onDestroy(() => {
      view?.removeEventListener('online', back);
      view?.removeEventListener('offline', gone);
    });
  }

  /** A call was answered, with whatever. */
  heard(): void {
    this.connected.set(true);
    this.answered.set(true);
  }

  /** A call was not answered. */
  silent(): void {
    this.answered.set(false);
  }
}
