import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { measuredWidth } from '../measured-width';
import type { BarWhiskerInput } from './bar-whisker-input';
import { layOutBarWhisker } from './bar-whisker-layout';

/** Bars from 0, each with a whisker on to a further value. */
@Component({
  selector: 'us-bar-whisker-chart',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './bar-whisker-chart.html',
  styleUrl: './bar-whisker-chart.scss',
  host: { '[style.min-height.px]': 'data().rows.length * 34 + 34' },
})
export class BarWhiskerChart {
  readonly data = input.required<BarWhiskerInput>();

  private readonly width = measuredWidth();
  protected readonly picture = computed(() =>
    this.width() > 0 ? layOutBarWhisker(this.data(), this.width()) : undefined,
  );
}
