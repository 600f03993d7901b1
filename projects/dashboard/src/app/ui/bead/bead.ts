import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  DestroyRef,
  ElementRef,
  inject,
  signal,
} from '@angular/core';
import { BEAD_DEPTH, beadPaths } from './bead-path';

/** The bead that runs along a seam: marks the open page, steps done and progress, and nothing else. As wide as its host. */
@Component({
  selector: 'us-bead',
  template: `
    <svg aria-hidden="true" [attr.width]="width()" [attr.height]="depth">
      <path class="body" [attr.d]="paths().body" />
      <path class="cuts" [attr.d]="paths().cuts" />
    </svg>
  `,
  styles: `
    :host {
      display: block;
      height: 6px;
    }
    svg {
      display: block;
      overflow: visible;
    }
    .body {
      fill: var(--us-oxide);
    }
    .cuts {
      fill: none;
      stroke: var(--us-paper);
      stroke-width: 0.8;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Bead {
  protected readonly depth = BEAD_DEPTH;
  protected readonly width = signal(0);
  protected readonly paths = computed(() => beadPaths(this.width()));

  constructor() {
    const host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
    const observer = new ResizeObserver(() => this.width.set(host.clientWidth));
    afterNextRender(() => {
      this.width.set(host.clientWidth);
      observer.observe(host);
    });
    inject(DestroyRef).onDestroy(() => observer.disconnect());
  }
}
