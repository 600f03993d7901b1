import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { Reading } from '../../core/api/reading';

/** What is being waited for, so that the wait has its outline. */
export type LoadShape = 'page' | 'answer' | 'sheet' | 'rows';

/**
 * The four states of something read from the server. Its content is shown when there is a value; while a newer one is under way the
 * content stays, dimmed. Content marked `usEmpty` is shown instead when `empty` says so: why there is nothing, and what to do.
 */
@Component({
  selector: 'us-load-state',
  imports: [MatButton],
  templateUrl: './load-state.html',
  styleUrl: './load-state.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LoadState {
  readonly of =
    input.required<
      Pick<Reading<unknown>, 'value' | 'loading' | 'refreshing' | 'problem' | 'reload'>
    >();
  readonly empty = input(false);
  readonly shape = input<LoadShape>('page');
  protected readonly rows = [0, 1, 2, 3, 4, 5, 6, 7];
}
