import { ChangeDetectionStrategy, Component } from '@angular/core';

/** Not built yet. */
@Component({
  selector: 'us-actions-page',
  template: '',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ActionsPage {}
