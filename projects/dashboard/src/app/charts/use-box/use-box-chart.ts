import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { laidOut } from '../laid-out';
import { Hatch } from '../pieces/hatch';
import { Picture } from '../pieces/picture';
import { TooFew } from '../pieces/too-few';
import { ValueMarks } from '../pieces/value-marks';
import type { UseBoxInput } from './use-box-input';
import { layOutUseBox, useBoxHeight } from './use-box-layout';

/** Product a car against the norm by kind of car: a box for half of the cars, a whisker for 8 of 10, the norm as a tick. */
@Component({
  selector: 'us-use-box-chart',
  imports: [Hatch, Picture, TooFew, ValueMarks],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './use-box-chart.html',
  styleUrl: './use-box-chart.scss',
  host: { '[style.min-height.px]': 'height()' },
})
export class UseBoxChart {
  readonly data = input.required<UseBoxInput>();

  protected readonly height = computed(() => useBoxHeight(this.data()));
  protected readonly picture = laidOut(this.data, layOutUseBox);
}
