import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { NewerVersion } from '../offline/newer-version';

/** The quiet line that a newer version is ready; the page is opened anew only when a person says so. */
@Component({
  selector: 'us-newer-version-line',
  template: `
    @if (newer.ready()) {
      <p class="us-column us-small" role="status">
        A newer version is ready.
        <button type="button" class="us-action" (click)="newer.takeOver()">Open it now</button>
        <span class="us-quiet">It opens by itself the next time.</span>
      </p>
    }
  `,
  styles: `
    p {
      padding-top: 10px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NewerVersionLine {
  protected readonly newer = inject(NewerVersion);
}
