import { Directive, input } from '@angular/core';

/** The frame of a chart: one image, as wide as it was laid out, its finding as the text alternative. */
@Directive({
  selector: '[usPicture]',
  host: {
    role: 'img',
    '[attr.aria-label]': 'summary()',
    '[attr.width]': 'usPicture().width',
    '[attr.viewBox]': "'0 0 ' + usPicture().width + ' ' + usPicture().height",
  },
})
export class Picture {
  /** The laid out picture, px. */
  readonly usPicture = input.required<{ readonly width: number; readonly height: number }>();
  readonly summary = input.required<string>();
}
