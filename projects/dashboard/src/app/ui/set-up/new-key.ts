import { ChangeDetectionStrategy, Component, DOCUMENT, inject, input, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';

/** A push key that has just been made, shown this once. */
@Component({
  selector: 'us-new-key',
  imports: [MatButton],
  template: `
    <p><strong>The key, shown only now.</strong> Copy it into the system that will use it.</p>
    <p class="key">{{ key() }}</p>
    <div class="foot">
      <button matButton="outlined" type="button" (click)="copy()">Copy the key</button>
      <span class="us-small" role="status">{{ said() }}</span>
    </div>
  `,
  styles: `
    :host {
      display: block;
      padding: 10px 16px;
      border-inline-start: 3px solid var(--us-tide);
      background: var(--us-paper);
    }
    .key {
      margin: 8px 0;
      overflow-wrap: anywhere;
      font-variant-numeric: tabular-nums;
    }
    .foot {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 12px;
    }
    strong {
      font-weight: 600;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NewKey {
  readonly key = input.required<string>();
  private readonly clipboard = inject(DOCUMENT).defaultView?.navigator.clipboard;
  protected readonly said = signal('');

  protected async copy(): Promise<void> {
    try {
      if (!this.clipboard) throw new Error('no clipboard');
      await this.clipboard.writeText(this.key());
      this.said.set('Copied.');
    } catch {
      // Browsers hand out the clipboard on secure pages only.
      this.said.set('This browser does not let pages copy. Mark the key and copy it by hand.');
    }
  }
}
