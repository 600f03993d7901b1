import { ChangeDetectionStrategy, Component } from '@angular/core';

/** Voided jobs. */
@Component({
  selector: 'us-voided-page',
  template: '<div class="us-column"></div>',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VoidedPage {}
