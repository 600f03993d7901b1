import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { drawnAreas } from './drawn-areas';
import { UndersideCar } from './underside-car';
import type { UndersideArea } from './underside-input';

/** The shaded car alone, small, for a control whose words stand beside it; not heard. */
@Component({
  selector: 'us-underside-small',
  imports: [UndersideCar],
  template: `<us-underside-car
    detail="small"
    aria-hidden="true"
    [places]="places()"
    [width]="92"
  />`,
  styles: `
    :host {
      display: block;
      width: 92px;
      height: 42px;
      padding: 3px 0;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UndersideSmall {
  readonly areas = input.required<readonly UndersideArea[]>();
  protected readonly places = computed(() => drawnAreas(this.areas()));
}
