import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { laidOut } from '../laid-out';
import { Hatch } from '../pieces/hatch';
import { Picture } from '../pieces/picture';
import { TooFew } from '../pieces/too-few';
import { ValueMarks } from '../pieces/value-marks';
import type { DotIntervalInput } from './dot-interval-input';
import { layOutDotInterval, type PlacedInterval } from './dot-interval-layout';

/** Groups as dots with 95 % intervals about a reference; groups with too few cars are hatched. */
@Component({
  selector: 'us-dot-interval-chart',
  imports: [Hatch, Picture, TooFew, ValueMarks],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './dot-interval-chart.html',
  styleUrl: './dot-interval-chart.scss',
  host: { '[style.min-height.px]': 'data().rows.length * 34 + 34' },
})
export class DotIntervalChart {
  readonly data = input.required<DotIntervalInput>();

  protected readonly picture = laidOut(this.data, layOutDotInterval);
  protected readonly min = Math.min;
  protected readonly max = Math.max;

  protected triangle(row: PlacedInterval): string {
    const { x } = row.dot!;
    return row.stand === 'above'
      ? `M${x - 6} ${row.y + 5}h12l-6 -10.5z`
      : `M${x - 6} ${row.y - 5}h12l-6 10.5z`;
  }

  protected arrow(row: PlacedInterval, left: number, right: number): string {
    return row.beyond === 'right'
      ? `M${right - 5} ${row.y - 5}l6 5l-6 5`
      : `M${left + 5} ${row.y - 5}l-6 5l6 5`;
  }
}
