import { ChangeDetectionStrategy, Component } from '@angular/core';

@Component({
  selector: 'us-warranty-page',
  template: '',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WarrantyPage {}
