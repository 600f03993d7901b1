import { ChangeDetectionStrategy, Component } from '@angular/core';

/** Not built yet. */
@Component({
  selector: 'us-branches-page',
  template: '',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BranchesPage {}
