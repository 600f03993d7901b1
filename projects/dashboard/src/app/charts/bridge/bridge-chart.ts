import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { measuredWidth } from '../measured-width';
import type { BridgeInput } from './bridge-input';
import { layOutBridge } from './bridge-layout';

/** A bridge (waterfall): one row a step, from a first total to a last one. */
@Component({
  selector: 'us-bridge-chart',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './bridge-chart.html',
  styleUrl: './bridge-chart.scss',
  host: { '[style.min-height.px]': 'data().rows.length * 33 + 6' },
})
export class BridgeChart {
  readonly data = input.required<BridgeInput>();

  private readonly width = measuredWidth();
  protected readonly picture = computed(() =>
    this.width() > 0 ? layOutBridge(this.data(), this.width()) : undefined,
  );
}
