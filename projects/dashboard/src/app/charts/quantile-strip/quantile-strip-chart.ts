import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { laidOut } from '../laid-out';
import { Hatch } from '../pieces/hatch';
import { Picture } from '../pieces/picture';
import { TooFew } from '../pieces/too-few';
import { ValueMarks } from '../pieces/value-marks';
import type { QuantileStripInput } from './quantile-strip-input';
import { layOutQuantileStrip } from './quantile-strip-layout';

/** Spread by group as a strip: a thick part from half of the cars to 8 of 10, a thin one on to 19 of 20. */
@Component({
  selector: 'us-quantile-strip-chart',
  imports: [Hatch, Picture, TooFew, ValueMarks],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './quantile-strip-chart.html',
  styleUrl: './quantile-strip-chart.scss',
  host: { '[style.min-height.px]': 'data().rows.length * 34 + 34' },
})
export class QuantileStripChart {
  readonly data = input.required<QuantileStripInput>();

  protected readonly picture = laidOut(this.data, layOutQuantileStrip);
}
