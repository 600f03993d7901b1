import { ChangeDetectionStrategy, Component, input, signal } from '@angular/core';
import type { IssuedReport } from '#shared/contracts/warranty-reports';
import { copyWords } from './copy-words';
import { sha256 } from './sha256';

/** Tells whether a file that somebody holds is the report as issued. The file is read here and sent nowhere. */
@Component({
  selector: 'us-compare-copy',
  template: `
    <label class="us-action">
      <input class="us-unseen" type="file" accept=".pdf,.csv" (change)="compare($event)" />
      Compare a copy with them
    </label>
    <p class="us-small us-quiet">It is read on this device and sent nowhere.</p>
    <p class="us-small said" role="status">{{ said() }}</p>
  `,
  styles: `
    label {
      display: inline-flex;
      align-items: center;
    }
    label:focus-within {
      outline: 2px solid var(--us-ink);
      outline-offset: 2px;
    }
    .said {
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CompareCopy {
  readonly issued = input.required<IssuedReport>();
  protected readonly said = signal('');

  protected async compare(event: Event): Promise<void> {
    const file = (event.target as HTMLInputElement).files?.[0];
    if (!file) return;
    this.said.set('Being read');
    this.said.set(copyWords(this.issued(), file.name, await sha256(file)));
  }
}
