import { ChangeDetectionStrategy, Component } from '@angular/core';

/** Not built yet. */
@Component({
  selector: 'us-unsubscribe-page',
  template: '',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UnsubscribePage {}
