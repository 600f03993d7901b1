import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { laidOut } from '../laid-out';
import { Picture } from '../pieces/picture';
import type { BridgeInput } from './bridge-input';
import { layOutBridge } from './bridge-layout';

/** A bridge (waterfall): one row a step, from a first total to a last one. */
@Component({
  selector: 'us-bridge-chart',
  imports: [Picture],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './bridge-chart.html',
  styleUrl: './bridge-chart.scss',
  host: { '[style.min-height.px]': 'data().rows.length * 33 + 6' },
})
export class BridgeChart {
  readonly data = input.required<BridgeInput>();

  protected readonly picture = laidOut(this.data, layOutBridge);
}
