import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { measuredWidth } from '../measured-width';
import { hatchWords } from '../text-width';
import type { UseBoxInput } from './use-box-input';
import { layOutUseBox, useBoxHeight } from './use-box-layout';

let charts = 0;

/** Product a car against the norm by kind of car: a box for half of the cars, a whisker for 8 of 10, the norm as a tick. */
@Component({
  selector: 'us-use-box-chart',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './use-box-chart.html',
  styleUrl: './use-box-chart.scss',
  host: { '[style.min-height.px]': 'height()' },
})
export class UseBoxChart {
  readonly data = input.required<UseBoxInput>();

  private readonly width = measuredWidth();
  protected readonly height = computed(() => useBoxHeight(this.data()));
  protected readonly hatch = `us-hatch-use-${++charts}`;
  protected readonly picture = computed(() =>
    this.width() > 0 ? layOutUseBox(this.data(), this.width()) : undefined,
  );
  protected readonly hatchWords = hatchWords;
}
