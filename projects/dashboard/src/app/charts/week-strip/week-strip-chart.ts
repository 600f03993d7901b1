import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { laidOut } from '../laid-out';
import { HeightTicks } from '../pieces/height-ticks';
import { Picture } from '../pieces/picture';
import type { WeekStripInput } from './week-strip-input';
import { layOutWeekStrip } from './week-strip-layout';

/** One branch's weeks as a small picture, to stand beside others of the same scale. */
@Component({
  selector: 'us-week-strip-chart',
  imports: [HeightTicks, Picture],
  templateUrl: './week-strip-chart.html',
  styleUrl: './week-strip-chart.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WeekStripChart {
  readonly data = input.required<WeekStripInput>();

  protected readonly picture = laidOut(this.data, layOutWeekStrip);

  protected shape({ x, y, mark }: { x: number; y: number; mark: string }): string {
    if (mark === 'run_low') return `M${x - 4.5} ${y - 3.5}h9l-4.5 7.5z`;
    if (mark === 'run_high') return `M${x - 4.5} ${y + 3.5}h9l-4.5 -7.5z`;
    return `M${x} ${y - 5.5}l5.5 5.5l-5.5 5.5l-5.5 -5.5z`;
  }
}
