import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { UndersideFinding } from './underside-input';

/** The findings of one job on the car seen from below, numbered in the order given, with their words in a list beside. */
@Component({
  selector: 'us-underside-marks',
  template: '',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UndersideMarks {
  readonly findings = input.required<readonly UndersideFinding[]>();
  /** `none` where the page has a list of its own, numbered in the same order. */
  readonly list = input<'beside' | 'none'>('beside');
}
