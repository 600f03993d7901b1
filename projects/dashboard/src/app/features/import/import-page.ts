import { ChangeDetectionStrategy, Component } from '@angular/core';

/** Import. */
@Component({
  selector: 'us-import-page',
  template: '<div class="us-column"></div>',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ImportPage {}
