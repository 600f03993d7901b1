import { ChangeDetectionStrategy, Component } from '@angular/core';

@Component({
  selector: 'us-claims-page',
  template: '',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ClaimsPage {}
