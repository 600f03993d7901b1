import { ChangeDetectionStrategy, Component } from '@angular/core';

/** Set-up. */
@Component({
  selector: 'us-set-up-page',
  template: '<div class="us-column"></div>',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SetUpPage {}
