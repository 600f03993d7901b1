import { ChangeDetectionStrategy, Component } from '@angular/core';
import { Mark } from '../../ui/mark/mark';

/** The frame of the pages before signing in: mark, name, seam, and one narrow column. */
@Component({
  selector: 'us-outer-frame',
  imports: [Mark],
  template: `
    <header>
      <div class="us-column"><us-mark /> Underseam</div>
    </header>
    <main class="us-column">
      <div class="narrow"><ng-content /></div>
    </main>
  `,
  styles: `
    header {
      height: 68px;
      border-bottom: 2px solid var(--us-ink);
    }
    header div {
      display: flex;
      align-items: center;
      gap: 12px;
      height: 100%;
      font: 600 20px/28px var(--us-font);
    }
    main {
      padding-top: 52px;
      padding-bottom: 40px;
    }
    .narrow {
      max-width: 420px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OuterFrame {}
