import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { laidOut } from '../laid-out';
import { Picture } from '../pieces/picture';
import { ValueMarks } from '../pieces/value-marks';
import type { BarWhiskerInput } from './bar-whisker-input';
import { layOutBarWhisker } from './bar-whisker-layout';

/** Bars from 0, each with a whisker on to a further value. */
@Component({
  selector: 'us-bar-whisker-chart',
  imports: [Picture, ValueMarks],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './bar-whisker-chart.html',
  styleUrl: './bar-whisker-chart.scss',
  host: { '[style.min-height.px]': 'data().rows.length * 34 + 34' },
})
export class BarWhiskerChart {
  readonly data = input.required<BarWhiskerInput>();

  protected readonly picture = laidOut(this.data, layOutBarWhisker);
}
