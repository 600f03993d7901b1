import { ChangeDetectionStrategy, Component } from '@angular/core';

/** Danger to people in a row or a line: the filled triangle in the alarm colour, and the word that goes with it. */
@Component({
  selector: 'us-danger-sign',
  template: `
    <svg viewBox="0 0 16 14" aria-hidden="true"><path d="M8 1 15 13H1Z" /></svg>
    <span><ng-content /></span>
  `,
  styles: `
    :host {
      display: inline-flex;
      align-items: baseline;
      gap: 5px;
      color: var(--us-alarm);
      font-weight: 600;
      white-space: nowrap;
    }
    svg {
      flex: none;
      width: 12px;
      height: 11px;
      fill: currentColor;
      stroke: currentColor;
      stroke-width: 1.5;
      stroke-linejoin: round;
      print-color-adjust: exact;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DangerSign {}
