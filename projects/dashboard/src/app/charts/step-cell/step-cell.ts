import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';

const WIDTH = 96;
const HEIGHT = 18;

/**
 * A signed step as a bar from zero, on one scale for all columns of a table. Its number stands beside it, so it is not heard.
 */
@Component({
  selector: 'us-step-cell',
  template: `
    <svg [attr.width]="width" [attr.height]="height" aria-hidden="true">
      @if (bar(); as b) {
        <rect
          [attr.class]="value() < 0 ? 'less' : 'more'"
          y="3"
          height="12"
          [attr.x]="b.x"
          [attr.width]="b.width"
        />
      }
      <line class="zero" y1="0" [attr.x1]="width / 2" [attr.x2]="width / 2" [attr.y2]="height" />
    </svg>
  `,
  styles: `
    :host {
      display: inline-block;
      vertical-align: middle;
    }
    svg {
      display: block;
      overflow: visible;
    }
    .more,
    .less {
      stroke: var(--us-ink);
      stroke-width: 0.75;
    }
    .more {
      fill: var(--us-ink);
    }
    .less {
      fill: var(--us-sheet);
    }
    .zero {
      stroke: var(--us-zinc);
      stroke-width: 1.25;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StepCell {
  readonly value = input.required<number>();
  /** The largest step of the table, whatever its sign. */
  readonly reach = input.required<number>();

  protected readonly width = WIDTH;
  protected readonly height = HEIGHT;
  protected readonly bar = computed(() => {
    const width = (Math.min(1, Math.abs(this.value()) / (this.reach() || 1)) * WIDTH) / 2;
    return { x: this.value() < 0 ? WIDTH / 2 - width : WIDTH / 2, width };
  });
}
