import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { measuredWidth } from '../measured-width';
import type { WaitDotsInput } from './wait-dots-input';
import { layOutWaitDots, usualWaitHeight, type PlacedDot } from './wait-dots-layout';

/** How long things have waited: a mark each, stacked over the time, a row a group; danger to people as filled triangles. */
@Component({
  selector: 'us-wait-dots-chart',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './wait-dots-chart.html',
  styleUrl: './wait-dots-chart.scss',
  host: { '[style.min-height.px]': 'least()' },
})
export class WaitDotsChart {
  readonly data = input.required<WaitDotsInput>();

  private readonly width = measuredWidth();
  protected readonly least = computed(() => usualWaitHeight(this.data()));
  protected readonly picture = computed(() =>
    this.width() > 0 ? layOutWaitDots(this.data(), this.width()) : undefined,
  );

  protected triangle({ x, y }: PlacedDot): string {
    return `M${x} ${y - 4.5}l4.6 8h-9.2z`;
  }
}
