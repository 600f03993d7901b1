import { ChangeDetectionStrategy, Component } from '@angular/core';

@Component({
  selector: 'us-reports-page',
  template: '',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReportsPage {}
