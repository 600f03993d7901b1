import { ChangeDetectionStrategy, Component } from '@angular/core';

/** A sentence about something that went wrong, led by an open triangle: state is never colour alone. */
@Component({
  selector: 'us-trouble',
  template: `
    <svg viewBox="0 0 16 14" aria-hidden="true"><path d="M8 1.5 15 13H1Z" /></svg>
    <span><ng-content /></span>
  `,
  styles: `
    :host {
      display: inline-flex;
      align-items: baseline;
      gap: 8px;
      color: var(--us-oxide);
      font: 500 14px/20px var(--us-font);
    }
    svg {
      flex: none;
      width: 13px;
      height: 12px;
      fill: none;
      stroke: currentColor;
      stroke-width: 1.5;
      stroke-linejoin: round;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Trouble {}
