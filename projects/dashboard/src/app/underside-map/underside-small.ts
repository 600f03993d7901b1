import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { UndersideArea } from './underside-input';

/** The shaded car alone, small, for a control whose words stand beside it; not heard. */
@Component({
  selector: 'us-underside-small',
  template: '',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UndersideSmall {
  readonly areas = input.required<readonly UndersideArea[]>();
}
