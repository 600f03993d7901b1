import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Side, Zone } from '#shared/domain/vocabulary';
import { naturalSides } from '#shared/domain/zone-sides';
import { measuredWidth } from '../charts/measured-width';
import { shapesOf } from './geometry/place-shapes';
import { placeKey, placeName } from './place-words';
import { type DrawnPlace, UndersideCar } from './underside-car';

const WIDEST_CAR = 480;

/** One place on the car seen from below, for words that stand beside it; not heard. Without a side, wherever the car has the zone. */
@Component({
  selector: 'us-underside-place',
  imports: [UndersideCar],
  template: `
    @if (width() > 0) {
      <us-underside-car
        detail="plain"
        aria-hidden="true"
        [places]="places()"
        [width]="width()"
        [style.width.px]="width()"
      />
    }
  `,
  styles: `
    :host {
      display: block;
      min-height: 120px;
    }
    us-underside-car {
      display: block;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UndersideOnePlace {
  readonly zone = input.required<Zone>();
  readonly side = input<Side | null>();

  private readonly room = measuredWidth();
  protected readonly width = computed(() => Math.min(WIDEST_CAR, this.room()));
  protected readonly places = computed((): readonly DrawnPlace[] => {
    const zone = this.zone();
    const side = this.side();
    return (side ? [side] : naturalSides(zone)).map((each) => ({
      key: placeKey({ zone, side: each }),
      name: placeName({ zone, side: each }),
      look: 'chosen',
      shapes: shapesOf(zone, each),
    }));
  });
}
