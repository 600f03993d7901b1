import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { PreviewRow } from '#shared/contracts/imports';
import { STATUS_NAMES } from './preview-rows';

/** A shape for each: a cross for what comes new, two strokes for what is the same, a wave for what changes, an open triangle for what is refused. */
const SHAPES: Readonly<Record<PreviewRow['status'], string>> = {
  new: 'M8 2v10M3 7h10',
  changed: 'M2 8c2-5 4-5 6-1s4 4 6-1',
  unchanged: 'M3 5h10M3 9h10',
  refused: 'M8 1.5 15 13H1Z',
};

/** What a row would do: a shape and its word. */
@Component({
  selector: 'us-row-status',
  template: `
    <svg viewBox="0 0 16 14" aria-hidden="true" [class]="of()"><path [attr.d]="shape()" /></svg>
    {{ word() }}
  `,
  styles: `
    :host {
      white-space: nowrap;
    }
    svg {
      width: 14px;
      height: 12px;
      margin-inline-end: 4px;
      vertical-align: -1px;
      fill: none;
      stroke: var(--us-quiet);
      stroke-width: 1.6;
      stroke-linejoin: round;
    }
    .new {
      stroke: var(--us-tide);
    }
    .changed {
      stroke: var(--us-amber);
    }
    .refused {
      stroke: var(--us-oxide);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RowStatus {
  readonly of = input.required<PreviewRow['status']>();
  protected readonly shape = computed(() => SHAPES[this.of()]);
  protected readonly word = computed(() => STATUS_NAMES[this.of()]);
}
