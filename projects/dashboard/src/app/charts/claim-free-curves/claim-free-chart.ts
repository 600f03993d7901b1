import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { laidOut } from '../laid-out';
import { HeightTicks } from '../pieces/height-ticks';
import { Picture } from '../pieces/picture';
import type { ClaimFreeInput } from './claim-free-input';
import { curvesHeight, layOutClaimFree } from './claim-free-layout';

/** Cars still without a claim by months since they were finished: steps with bands, told apart by stroke and name, cars at risk below. */
@Component({
  selector: 'us-claim-free-chart',
  imports: [HeightTicks, Picture],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './claim-free-chart.html',
  styleUrl: './claim-free-chart.scss',
  host: { '[style.min-height.px]': 'least()' },
})
export class ClaimFreeChart {
  readonly data = input.required<ClaimFreeInput>();

  protected readonly picture = laidOut(this.data, layOutClaimFree);

  /** Kept before the width is known, so that what follows does not move much. */
  protected least(): number {
    return curvesHeight(this.data().curves.length, false);
  }
}
