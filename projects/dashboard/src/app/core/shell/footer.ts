import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterLink } from '@angular/router';

/** The foot of every page: where the definitions are, and what the product is not. */
@Component({
  selector: 'us-footer',
  imports: [RouterLink],
  template: `
    <footer class="us-column us-small us-quiet">
      <a routerLink="/how-it-is-counted">How it is counted</a>
      <span>Underseam informs, it does not certify.</span>
    </footer>
  `,
  styles: `
    footer {
      display: flex;
      flex-wrap: wrap;
      gap: 4px 24px;
      padding-top: 40px;
      padding-bottom: 24px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Footer {}
