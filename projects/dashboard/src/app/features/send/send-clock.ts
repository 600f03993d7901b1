import { DestroyRef, inject, Injectable, signal } from '@angular/core';

/** How often a running timer moves on screen, ms. */
const TICK = 10_000;

/** The device's clock for timers: business days come from the catalogue, worked minutes from the real hour. */
@Injectable()
export class SendClock {
  private readonly instant = signal(Date.now());
  /** The present instant, ms; moves by itself. */
  readonly now = this.instant.asReadonly();

  constructor() {
    const timer = setInterval(() => this.instant.set(Date.now()), TICK);
    inject(DestroyRef).onDestroy(() => clearInterval(timer));
  }

  /** The instant right now, for starting and stopping. */
  read(): number {
    this.instant.set(Date.now());
    return this.instant();
  }
}
