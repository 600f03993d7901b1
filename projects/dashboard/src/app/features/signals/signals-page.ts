import { ChangeDetectionStrategy, Component } from '@angular/core';

/** Not built yet. */
@Component({
  selector: 'us-signals-page',
  template: '',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignalsPage {}
