import { ChangeDetectionStrategy, Component } from '@angular/core';

/** Not built yet. */
@Component({
  selector: 'us-targets-page',
  template: '',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TargetsPage {}
