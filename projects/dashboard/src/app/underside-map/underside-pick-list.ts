import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { SIDES, ZONES } from '#shared/domain/vocabulary';
import { SIDE_NAMES, ZONE_NAMES } from '../ui/words';
import { isSame, isUnusual } from './pick-places';
import { placeKey, placeName } from './place-words';
import type { UndersidePlace } from './underside-input';

let lists = 0;

/** Every zone with every side as one group of radio buttons: the map's control without its picture. */
@Component({
  selector: 'us-underside-pick-list',
  templateUrl: './underside-pick-list.html',
  styleUrl: './underside-pick-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UndersidePickList {
  readonly heading = input.required<string>();
  readonly place = input.required<UndersidePlace | null>();
  readonly picked = output<UndersidePlace>();

  protected readonly id = `us-underside-list-${++lists}`;
  protected readonly rows = computed(() =>
    ZONES.map((zone) => ({
      zone,
      name: ZONE_NAMES[zone],
      places: SIDES.map((side) => ({
        key: placeKey({ zone, side }),
        place: { zone, side },
        words: SIDE_NAMES[side],
        name: placeName({ zone, side }),
        unusual: isUnusual({ zone, side }),
        chosen: isSame(this.place(), { zone, side }),
      })),
    })),
  );
}
