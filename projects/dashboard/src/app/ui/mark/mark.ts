import { ChangeDetectionStrategy, Component } from '@angular/core';

/** The mark: a horizontal seam with a bead along its underside. Drawn on 112 × 34 units; its width is its host's. */
@Component({
  selector: 'us-mark',
  template: `
    <svg viewBox="0 0 112 34" aria-hidden="true">
      <rect class="seam" width="112" height="12" rx="6" />
      <path
        class="bead"
        d="M10.5 12H33c4.6 6.6 4.2 15 .8 21.8C18.4 34 11 26.5 10.5 12Z
           M37 12h19.5c4.6 6.6 4.2 15 .6 22H38.2C41.6 27 41.6 18.6 37 12Z
           M60.6 12H86c-.5 14.5-8 22-24 22 3.2-7 3.2-15.4-1.4-22Z"
      />
    </svg>
  `,
  styles: `
    :host {
      display: inline-block;
      width: 34px;
    }
    svg {
      display: block;
      width: 100%;
      height: auto;
    }
    .seam {
      fill: var(--us-ink);
    }
    .bead {
      fill: var(--us-oxide);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Mark {}
