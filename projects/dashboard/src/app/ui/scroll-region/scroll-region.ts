import {
  afterNextRender,
  ChangeDetectionStrategy,
  ChangeDetectorRef,
  Component,
  computed,
  DestroyRef,
  type ElementRef,
  inject,
  input,
  signal,
  viewChild,
} from '@angular/core';

/**
 * Lets something wide scroll inside itself rather than the page; reachable by keyboard when it does scroll. A quiet line under it
 * says on which side there is more; those who hear the page are told by the region's name.
 */
@Component({
  selector: 'us-scroll-region',
  template: `
    <div
      #box
      [attr.tabindex]="scrolls() ? 0 : null"
      [attr.role]="scrolls() ? 'region' : null"
      [attr.aria-label]="scrolls() ? label() + ', scrolls sideways' : null"
      (scroll)="measure()"
    >
      <ng-content />
    </div>
    @if (hint(); as words) {
      <p class="us-small us-quiet us-unprinted" aria-hidden="true">{{ words }}</p>
    }
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
    p {
      padding-top: 2px;
      text-align: end;
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
  private readonly hidden = signal({ before: false, after: false });
  protected readonly scrolls = computed(() => this.hidden().before || this.hidden().after);
  protected readonly hint = computed(() => {
    const { before, after } = this.hidden();
    if (!before && !after) return '';
    return `${before ? '← ' : ''}More columns${after ? ' →' : ''}`;
  });

  constructor() {
    const changes = inject(ChangeDetectorRef);
    const observer = new ResizeObserver(() => {
      this.measure();
      // Before this very frame is painted, so that nothing below moves once it is seen.
      changes.detectChanges();
    });
    afterNextRender(() => {
      const box = this.box().nativeElement;
      observer.observe(box);
      if (box.firstElementChild) observer.observe(box.firstElementChild);
    });
    inject(DestroyRef).onDestroy(() => observer.disconnect());
  }

  protected measure(): void {
    const { scrollLeft, scrollWidth, clientWidth } = this.box().nativeElement;
    const before = scrollLeft > 1;
    const after = scrollWidth - clientWidth - scrollLeft > 1;
    const now = this.hidden();
    if (now.before !== before || now.after !== after) this.hidden.set({ before, after });
  }
}
