import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { LiveNews } from './live-news';

/** The quiet line at the foot of the window that says what has just come in. It takes no room of the page and no clicks. */
@Component({
  selector: 'us-live-line',
  template: `
    @if (news.line(); as sentence) {
      <p class="us-small">{{ sentence }}</p>
    }
  `,
  styles: `
    p {
      position: fixed;
      z-index: 1;
      bottom: 16px;
      left: 16px;
      max-width: calc(100vw - 32px);
      padding: 8px 14px;
      border: 1px solid var(--us-hairline);
      border-radius: var(--us-radius);
      background: var(--us-sheet);
      color: var(--us-ink);
      pointer-events: none;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LiveLine {
  protected readonly news = inject(LiveNews);
}
