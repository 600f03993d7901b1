import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  type ElementRef,
  inject,
  input,
  signal,
  viewChild,
} from '@angular/core';

/** Lets something wide scroll inside itself rather than the page; reachable by keyboard when it does scroll. */
@Component({
  selector: 'us-scroll-region',
  template: `
    <div
      #box
      [attr.tabindex]="scrolls() ? 0 : null"
      [attr.role]="scrolls() ? 'region' : null"
      [attr.aria-label]="scrolls() ? label() + ', scrolls sideways' : null"
    >
      <ng-content />
    </div>
  `,
  styles: `
    :host {
      display: block;
      min-width: 0;
    }
    div {
      overflow-x: auto;
      // Absolutely placed words for screen readers must not widen the page.
      position: relative;
    }
    @media print {
      div {
        overflow: visible;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ScrollRegion {
  readonly label = input.required<string>();
  private readonly box = viewChild.required<ElementRef<HTMLElement>>('box');
  protected readonly scrolls = signal(false);

  constructor() {
    const observer = new ResizeObserver(() => {
      const box = this.box().nativeElement;
      this.scrolls.set(box.scrollWidth > box.clientWidth + 1);
    });
    afterNextRender(() => {
      const box = this.box().nativeElement;
      observer.observe(box);
      if (box.firstElementChild) observer.observe(box.firstElementChild);
    });
    inject(DestroyRef).onDestroy(() => observer.disconnect());
  }
}
