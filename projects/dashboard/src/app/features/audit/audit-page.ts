import { ChangeDetectionStrategy, Component } from '@angular/core';

/** Audit trail. */
@Component({
  selector: 'us-audit-page',
  template: '<div class="us-column"></div>',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AuditPage {}
