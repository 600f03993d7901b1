import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { measuredWidth } from '../measured-width';
import { hatchWords } from '../text-width';
import type { QuantileStripInput } from './quantile-strip-input';
import { layOutQuantileStrip } from './quantile-strip-layout';

let charts = 0;

/** Spread by group as a strip: a thick part from half of the cars to 8 of 10, a thin one on to 19 of 20. */
@Component({
  selector: 'us-quantile-strip-chart',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './quantile-strip-chart.html',
  styleUrl: './quantile-strip-chart.scss',
  host: { '[style.min-height.px]': 'data().rows.length * 34 + 34' },
})
export class QuantileStripChart {
  readonly data = input.required<QuantileStripInput>();

  private readonly width = measuredWidth();
  protected readonly hatch = `us-hatch-strip-${++charts}`;
  protected readonly picture = computed(() =>
    this.width() > 0 ? layOutQuantileStrip(this.data(), this.width()) : undefined,
  );
  protected readonly hatchWords = hatchWords;
}
