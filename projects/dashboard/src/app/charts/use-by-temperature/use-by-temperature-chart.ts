import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { laidOut } from '../laid-out';
import { Hatch } from '../pieces/hatch';
import { HeightTicks } from '../pieces/height-ticks';
import { Picture } from '../pieces/picture';
import type { UseByTemperatureInput } from './use-by-temperature-input';
import { layOutUseByTemperature, TEMPERATURE_HEIGHT } from './use-by-temperature-layout';

/** Product a car by workshop temperature: a bar for half of the cars of each class, a line at their median. */
@Component({
  selector: 'us-use-by-temperature-chart',
  imports: [Hatch, HeightTicks, Picture],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './use-by-temperature-chart.html',
  styleUrl: './use-by-temperature-chart.scss',
  host: { '[style.min-height.px]': 'height' },
})
export class UseByTemperatureChart {
  readonly data = input.required<UseByTemperatureInput>();

  protected readonly height = TEMPERATURE_HEIGHT;
  protected readonly picture = laidOut(this.data, layOutUseByTemperature);
}
