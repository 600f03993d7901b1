import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';

/** A small mark beside a figure that leads to its definition on the page "How it is counted". */
@Component({
  selector: 'us-definition-link',
  imports: [RouterLink],
  template: `
    <a
      routerLink="/how-it-is-counted"
      [fragment]="of()"
      class="us-unprinted"
      title="How it is counted"
    >
      <svg viewBox="0 0 16 16" aria-hidden="true">
        <circle cx="8" cy="8" r="7" />
        <path d="M8 7.2v4.2" />
        <circle class="dot" cx="8" cy="4.6" r="1" />
      </svg>
      <span class="us-unseen">How {{ name() || 'it' }} is counted</span>
    </a>
  `,
  styles: `
    :host {
      display: inline-block;
      vertical-align: baseline;
    }
    a {
      display: inline-grid;
      place-items: center;
      width: 24px;
      height: 24px;
      border-radius: 50%;
      color: var(--us-quiet);
    }
    a:hover {
      color: var(--us-oxide);
    }
    svg {
      width: 16px;
      height: 16px;
      fill: none;
      stroke: currentColor;
      stroke-width: 1.25;
      stroke-linecap: round;
    }
    .dot {
      fill: currentColor;
      stroke: none;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DefinitionLink {
  /** Anchor of the definition, for example `margin`. */
  readonly of = input.required<string>();
  /** What is counted, in words, for those who hear the link: "margin". */
  readonly name = input('');
}
