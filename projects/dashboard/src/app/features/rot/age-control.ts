import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { AgeBand } from '#shared/domain/vocabulary';
import { UndersideSmall } from '../../underside-map/underside-small';
import type { AgeOption } from './rot-series';

/** Chooses an age by what its cars looked like: small maps as radio buttons, the chosen one pointing at the large map. */
@Component({
  selector: 'us-age-control',
  imports: [UndersideSmall],
  templateUrl: './age-control.html',
  styleUrl: './age-control.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AgeControl {
  readonly ages = input.required<readonly AgeOption[]>();
  readonly chosen = input.required<AgeBand>();
  readonly picked = output<AgeBand>();
}
