import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { Condition } from '#shared/domain/vocabulary';

/** The sign of a condition of rust, drawn from the seam: specks on a line, a bump, a gap. Always stands with its word. */
@Component({
  selector: 'us-condition-sign',
  template: `
    <svg viewBox="0 0 20 12" aria-hidden="true">
      @switch (of()) {
        @case ('surface') {
          <path d="M1 8.5h18" />
          <path class="specks" d="M4.5 4.5h.01M10 4.5h.01M15.5 4.5h.01" />
        }
        @case ('bubbling') {
          <path d="M1 9h3.5c1.5 0 1.5-6 5.5-6s4 6 5.5 6H19" />
        }
        @default {
          <path d="M1 6h6M13 6h6M4.5 3.5 7 6 4.5 8.5M15.5 3.5 13 6l2.5 2.5" />
        }
      }
    </svg>
  `,
  styles: `
    :host {
      display: inline-block;
      width: 20px;
      height: 12px;
    }
    svg {
      display: block;
      fill: none;
      stroke: currentColor;
      stroke-width: 1.75;
      stroke-linecap: round;
      stroke-linejoin: round;
    }
    .specks {
      stroke-width: 2.4;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConditionSign {
  readonly of = input.required<Condition>();
}
