import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { Point } from './geometry/outline';
import type { Mark } from './marks-layout';

/** What lies over the car: numbered marks, and the ring where a touch landed. Not heard; its words stand beside it. */
@Component({
  selector: 'us-underside-marks-layer',
  templateUrl: './underside-marks-layer.html',
  styleUrl: './underside-marks-layer.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UndersideMarksLayer {
  readonly width = input.required<number>();
  readonly height = input.required<number>();
  readonly marks = input.required<readonly Mark[]>();
  /** `signed` marks carry the sign of the condition, `numbered` ones are the number alone. */
  readonly kind = input<'signed' | 'numbered'>('signed');
  readonly ring = input<Point | null>(null);
  /** Radius of the ring in px. */
  readonly reach = input(0);
}
