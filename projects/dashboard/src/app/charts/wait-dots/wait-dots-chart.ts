import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { laidOut } from '../laid-out';
import { Picture } from '../pieces/picture';
import { ValueMarks } from '../pieces/value-marks';
import type { WaitDotsInput } from './wait-dots-input';
import { layOutWaitDots, usualWaitHeight, type PlacedDot } from './wait-dots-layout';

/** How long things have waited: a mark each, stacked over the time, a row a group; danger to people as filled triangles. */
@Component({
  selector: 'us-wait-dots-chart',
  imports: [Picture, ValueMarks],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './wait-dots-chart.html',
  styleUrl: './wait-dots-chart.scss',
  host: { '[style.min-height.px]': 'least()' },
})
export class WaitDotsChart {
  readonly data = input.required<WaitDotsInput>();

  protected readonly least = computed(() => usualWaitHeight(this.data()));
  protected readonly picture = laidOut(this.data, layOutWaitDots);

  protected triangle({ x, y }: PlacedDot): string {
    return `M${x} ${y - 4.5}l4.6 8h-9.2z`;
  }
}
