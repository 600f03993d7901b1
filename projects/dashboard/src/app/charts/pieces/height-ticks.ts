import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** The value axis of a picture whose values rise: a hairline across at each tick, its words before it. */
@Component({
  selector: 'g[us-height-ticks]',
  template: `
    @for (tick of ticks(); track tick.y) {
      <svg:line
        class="hairline"
        [attr.x1]="left()"
        [attr.x2]="right()"
        [attr.y1]="tick.y"
        [attr.y2]="tick.y"
      />
      <svg:text class="quiet" text-anchor="end" [attr.x]="left() - gap()" [attr.y]="tick.y">
        {{ tick.text }}
      </svg:text>
    }
  `,
  styleUrl: './piece.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HeightTicks {
  readonly ticks = input.required<readonly { readonly y: number; readonly text: string }[]>();
  /** Both ends of the hairlines, px. */
  readonly left = input.required<number>();
  readonly right = input.required<number>();
  /** From the end of the words to the hairline. */
  readonly gap = input(10);
}
