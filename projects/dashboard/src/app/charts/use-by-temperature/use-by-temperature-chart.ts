import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { measuredWidth } from '../measured-width';
import type { UseByTemperatureInput } from './use-by-temperature-input';
import { layOutUseByTemperature, TEMPERATURE_HEIGHT } from './use-by-temperature-layout';

let charts = 0;

/** Product a car by workshop temperature: a bar for half of the cars of each class, a line at their median. */
@Component({
  selector: 'us-use-by-temperature-chart',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './use-by-temperature-chart.html',
  styleUrl: './use-by-temperature-chart.scss',
  host: { '[style.min-height.px]': 'height' },
})
export class UseByTemperatureChart {
  readonly data = input.required<UseByTemperatureInput>();

  private readonly width = measuredWidth();
  protected readonly height = TEMPERATURE_HEIGHT;
  protected readonly hatch = `us-hatch-temperature-${++charts}`;
  protected readonly picture = computed(() =>
    this.width() > 0 ? layOutUseByTemperature(this.data(), this.width()) : undefined,
  );
}
