import { ChangeDetectionStrategy, Component } from '@angular/core';

/** Send a job. */
@Component({
  selector: 'us-send-page',
  template: '<div class="us-column"></div>',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SendPage {}
