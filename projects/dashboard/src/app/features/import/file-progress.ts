import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { ImportedFile } from '#shared/contracts/imports';
import { formatCount } from '../../ui/format';
import { Progress } from '../../ui/progress/progress';

/** Rows checked or written so far, and the way to stop. */
@Component({
  selector: 'us-file-progress',
  imports: [MatButton, Progress],
  template: `
    <us-progress
      [label]="label()"
      [done]="progress().of === null ? 0 : progress().done"
      [of]="progress().of ?? 1"
      [words]="words()"
    />
    <p class="us-number">{{ words() }}</p>
    <button matButton="outlined" type="button" [disabled]="busy()" (click)="stop.emit()">
      {{ stopWords() }}
    </button>
  `,
  styles: `
    :host {
      display: grid;
      gap: 8px;
      max-width: 720px;
    }
    button {
      justify-self: start;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FileProgress {
  readonly label = input.required<string>();
  readonly stopWords = input.required<string>();
  readonly progress = input.required<ImportedFile['progress']>();
  readonly busy = input.required<boolean>();
  readonly stop = output();

  protected readonly words = computed(() => {
    const { done, of } = this.progress();
    return of === null
      ? `${formatCount(done)} rows so far`
      : `${formatCount(done)} of ${formatCount(of)} rows`;
  });
}
