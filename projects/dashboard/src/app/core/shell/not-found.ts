import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterLink } from '@angular/router';

/** Shown at an address that no page has. */
@Component({
  selector: 'us-not-found',
  imports: [RouterLink],
  template: `
    <div class="us-column">
      <h1>There is no page at this address</h1>
      <p>It may have been mistyped or cut short. <a routerLink="/">To your first page</a></p>
    </div>
  `,
  styles: `
    :host {
      display: block;
      padding-top: 52px;
    }
    h1 {
      font: 400 28px/40px var(--us-font);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NotFound {}
