import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import { measuredWidth } from '../charts/measured-width';
import { Tooltip } from '../charts/pieces/tooltip';
import { formatList } from '../ui/format';
import { TableTwin } from '../ui/table-twin/table-twin';
import { placed } from './car-place';
import { drawnAreas } from './drawn-areas';
import { anchorOf } from './geometry/anchors';
import { layOutMap, LABELLED_FROM } from './map-layout';
import { MAP_COLUMNS } from './map-columns';
import { paintAreas } from './paint-areas';
import { areaLines, placeKey, placeName, shareWords } from './place-words';
import { UndersideCar } from './underside-car';
import type { UndersideArea } from './underside-input';
import { UndersideLegend } from './underside-legend';

const TOOLTIP_WIDTH = 210;
/** As many places are named under a map that has no room for labels. */
const NAMED = 5;

/**
 * The car seen from below, its zones shaded by the share of cars with rot, and the same figures as a table one press away. A place
 * is read by pointer or arrow keys, and picked with a click or Enter.
 */
@Component({
  selector: 'us-underside-map',
  imports: [TableTwin, Tooltip, UndersideCar, UndersideLegend],
  templateUrl: './underside-map.html',
  styleUrl: './underside-map.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UndersideMap {
  readonly areas = input.required<readonly UndersideArea[]>();
  /** Names the thing and its unit. */
  readonly heading = input.required<string>();
  /** The picture's finding as a sentence. */
  readonly finding = input.required<string>();
  /** The quiet line below the heading: the method in one breath. */
  readonly note = input('');
  /** Anchor of the definition on "How it is counted". */
  readonly definition = input<string>();
  /** The place that was picked by pointer or with Enter. */
  readonly chosen = output<UndersideArea>();

  private readonly width = measuredWidth();
  private readonly painting = computed(() => paintAreas(this.areas()));
  private readonly pointedKey = signal<string | null>(null);
  protected readonly columns = MAP_COLUMNS;
  protected readonly places = computed(() => drawnAreas(this.areas()));
  protected readonly picture = computed(() =>
    this.width() > 0 ? layOutMap(this.painting().painted, this.width()) : undefined,
  );
  protected readonly labelled = computed(() => this.width() >= LABELLED_FROM);
  /** What no shape was left for. */
  protected readonly inWords = computed(() =>
    formatList(this.painting().inWords.map((area) => `${placeName(area)}: ${shareWords(area)}`)),
  );
  protected readonly highest = computed(() =>
    this.areas()
      .filter((area) => area.share !== null)
      .sort((a, b) => b.share! - a.share!)
      .slice(0, NAMED)
      .map((area) => ({ key: placeKey(area), name: placeName(area), share: shareWords(area) })),
  );
  protected readonly tooltip = computed(() => {
    const area = this.areas().find((each) => placeKey(each) === this.pointedKey());
    const picture = this.picture();
    if (!area || !picture) return undefined;
    const [x, y] = placed(picture.car, anchorOf(area.zone, area.side));
    const left = Math.max(0, Math.min(x - TOOLTIP_WIDTH / 2, picture.width - TOOLTIP_WIDTH));
    const above = y > picture.height / 2;
    return { left, top: above ? y - 18 : y + 18, above, lines: areaLines(area) };
  });

  protected point(key: string | null): void {
    this.pointedKey.set(key);
  }

  protected choose(key: string | undefined): void {
    const area = this.areas().find((each) => placeKey(each) === key);
    if (area) this.chosen.emit(area);
  }
}
