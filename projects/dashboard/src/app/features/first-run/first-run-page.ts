import { ChangeDetectionStrategy, Component } from '@angular/core';

/** First steps. */
@Component({
  selector: 'us-first-run-page',
  template: '<div class="us-column"></div>',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FirstRunPage {}
