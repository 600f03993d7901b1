import { ChangeDetectionStrategy, Component } from '@angular/core';

@Component({
  selector: 'us-claim-page',
  template: '',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ClaimPage {}
