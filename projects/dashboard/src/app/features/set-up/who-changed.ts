import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';

/** Leads to what the audit trail has on something. */
@Component({
  selector: 'us-who-changed',
  imports: [RouterLink],
  template: `<a class="us-small" routerLink="/audit" [queryParams]="{ subject: subject() }"
    >Who changed this</a
  >`,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WhoChanged {
  /** As the trail names it: `/branches/HAV`. */
  readonly subject = input.required<string>();
}
