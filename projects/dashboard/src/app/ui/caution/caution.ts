import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** Danger to people: the alarm rule at the left, a filled triangle, and the danger as the first word. */
@Component({
  selector: 'us-caution',
  template: `
    <svg viewBox="0 0 20 18" aria-hidden="true">
      <path class="sign" d="M10 1 19.2 17H.8Z" />
      <path class="mark" d="M10 6.5v5M10 14h.01" />
    </svg>
    <p>
      <strong>{{ danger() }}.</strong> {{ words() }}
    </p>
  `,
  styles: `
    :host {
      display: flex;
      gap: 10px;
      padding: 6px 0 6px 14px;
      border-inline-start: 3px solid var(--us-alarm);
      font-size: 14px;
      line-height: 20px;
    }
    svg {
      flex: none;
      width: 20px;
      height: 18px;
      margin-top: 1px;
    }
    .sign {
      fill: var(--us-alarm);
      stroke: var(--us-alarm);
      stroke-linejoin: round;
    }
    .mark {
      fill: none;
      stroke: var(--us-sheet);
      stroke-width: 1.8;
      stroke-linecap: round;
    }
    strong {
      color: var(--us-alarm);
      font-weight: 600;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Caution {
  /** The danger in a word: "Fire". */
  readonly danger = input.required<string>();
  readonly words = input.required<string>();
}
