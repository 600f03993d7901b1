import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { laidOut } from '../laid-out';
import { HeightTicks } from '../pieces/height-ticks';
import { Picture } from '../pieces/picture';
import type { ValueCurveInput } from './value-curve-input';
import { CURVE_HEIGHT, layOutValueCurve } from './value-curve-layout';

/** How one value moves with another, the chosen point ringed and named. */
@Component({
  selector: 'us-value-curve-chart',
  imports: [HeightTicks, Picture],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './value-curve-chart.html',
  styleUrl: './value-curve-chart.scss',
  host: { '[style.min-height.px]': 'height' },
})
export class ValueCurveChart {
  readonly data = input.required<ValueCurveInput>();

  protected readonly height = CURVE_HEIGHT;
  protected readonly picture = laidOut(this.data, (data, width) =>
    data.points.length > 0 ? layOutValueCurve(data, width) : undefined,
  );
}
