import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** A tooltip with its place in the picture, px: over its point where `above`. */
export interface Tip {
  readonly left: number;
  readonly top: number;
  readonly above: boolean;
  readonly lines: readonly string[];
}

/** What is pointed at in a picture, in lines: what is heard says the same, so it is only seen. Its width is the picture's to set. */
@Component({
  selector: 'us-tooltip',
  template: `
    @for (line of tip().lines; track $index) {
      <span>{{ line }}</span>
    }
  `,
  styleUrl: './tooltip.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: {
    'aria-hidden': 'true',
    '[class.above]': 'tip().above',
    '[style.left.px]': 'tip().left',
    '[style.top.px]': 'tip().top',
  },
})
export class Tooltip {
  readonly tip = input.required<Tip>();
}
