import { ChangeDetectionStrategy, Component, input } from '@angular/core';

let hatches = 0;

/** The hatching that stands for too few cars, as a fill: `<pattern us-hatch #hatch="usHatch" />`, then `[attr.fill]="hatch.fill"`. */
@Component({
  selector: 'pattern[us-hatch]',
  exportAs: 'usHatch',
  template: '<svg:rect [attr.width]="line()" [attr.height]="pitch()" />',
  styleUrl: './hatch.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: {
    '[attr.id]': 'id',
    '[attr.width]': 'pitch()',
    '[attr.height]': 'pitch()',
    patternUnits: 'userSpaceOnUse',
    patternTransform: 'rotate(45)',
  },
})
export class Hatch {
  /** From one line to the next, and how wide a line is, in units of the picture. */
  readonly pitch = input(7);
  readonly line = input(2.4);
  protected readonly id = `us-hatch-${++hatches}`;
  /** The fill of a shape that is to be hatched. */
  readonly fill = `url(#${this.id})`;
}
