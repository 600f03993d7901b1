import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { measuredWidth } from '../measured-width';
import type { ValueCurveInput } from './value-curve-input';
import { CURVE_HEIGHT, layOutValueCurve } from './value-curve-layout';

/** How one value moves with another, the chosen point ringed and named. */
@Component({
  selector: 'us-value-curve-chart',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './value-curve-chart.html',
  styleUrl: './value-curve-chart.scss',
  host: { '[style.min-height.px]': 'height' },
})
export class ValueCurveChart {
  readonly data = input.required<ValueCurveInput>();

  private readonly width = measuredWidth();
  protected readonly height = CURVE_HEIGHT;
  protected readonly picture = computed(() =>
    this.width() > 0 && this.data().points.length > 0
      ? layOutValueCurve(this.data(), this.width())
      : undefined,
  );
}
