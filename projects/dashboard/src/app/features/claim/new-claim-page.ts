import { ChangeDetectionStrategy, Component } from '@angular/core';

@Component({
  selector: 'us-new-claim-page',
  template: '',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NewClaimPage {}
