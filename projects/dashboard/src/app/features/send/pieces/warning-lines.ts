import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { OpenDraft } from '../open-draft';

/** What is unusual about a field, in amber with a diamond and in words; it keeps nobody from going on. */
@Component({
  selector: 'us-warning-lines',
  template: `
    <div aria-live="polite">
      @for (words of draft.warningsAt(path()); track $index) {
        <p>
          <svg viewBox="0 0 14 14" aria-hidden="true"><path d="M7 1 13 7 7 13 1 7Z" /></svg>
          <span><span class="us-unseen">Unusual: </span>{{ words }}</span>
        </p>
      }
    </div>
  `,
  styles: `
    p {
      display: flex;
      gap: 8px;
      align-items: baseline;
      margin-top: 4px;
      font-size: 14px;
      line-height: 20px;
    }
    svg {
      flex: none;
      width: 12px;
      height: 12px;
      fill: var(--us-amber);
      stroke: var(--us-ink);
      stroke-width: 1.25;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WarningLines {
  readonly path = input.required<string>();
  protected readonly draft = inject(OpenDraft);
}
