import { ChangeDetectionStrategy, Component, input, model } from '@angular/core';
import type { UndersideFinding, UndersidePlace } from './underside-input';

/** Where a finding is: touched on the car seen from below, or picked from a list. The two are one control. */
@Component({
  selector: 'us-underside-pick',
  template: '',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UndersidePick {
  readonly place = model<UndersidePlace | null>(null);
  /** Which of the two ways is shown. */
  readonly view = model<'picture' | 'list'>('picture');
  /** Findings set before, numbered on the map in the order given. */
  readonly findings = input<readonly UndersideFinding[]>([]);
  /** What is being placed: "Third finding". */
  readonly heading = input('Finding');
}
