import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';

/** A steadied share as a cell of a table draws it. */
export interface ShareCellInput {
  /** As counted; null where there are too few cars. */
  readonly counted: number | null;
  readonly steadied: number;
  readonly lower: number;
  readonly upper: number;
  /** Share of all, the dashed line. */
  readonly all: number | null;
}

const WIDTH = 112;
const HEIGHT = 22;
const PAD = 6;

/**
 * A small interval beside its numbers: filled dot as steadied, hollow diamond as counted, dashed line all of them. Its numbers
 * stand in the same row, so it is not heard.
 */
@Component({
  selector: 'us-share-cell',
  template: `
    <svg [attr.width]="width" [attr.height]="height" aria-hidden="true">
      @if (place(); as p) {
        @if (p.all !== null) {
          <line class="all" [attr.x1]="p.all" [attr.x2]="p.all" y1="0" [attr.y2]="height" />
        }
        <line
          class="interval"
          [attr.x1]="p.lower"
          [attr.x2]="p.upper"
          [attr.y1]="middle"
          [attr.y2]="middle"
        />
        <circle class="dot" r="4.5" [attr.cx]="p.steadied" [attr.cy]="middle" />
        @if (p.counted !== null) {
          <path class="counted" [attr.d]="diamond(p.counted)" />
        }
      }
    </svg>
  `,
  styleUrl: './share-cell.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ShareCell {
  readonly data = input.required<ShareCellInput>();
  /** Share at the right end of the axis; the left is 0. */
  readonly end = input.required<number>();

  protected readonly width = WIDTH;
  protected readonly height = HEIGHT;
  protected readonly middle = HEIGHT / 2;
  protected readonly place = computed(() => {
    const { counted, steadied, lower, upper, all } = this.data();
    const at = (share: number): number =>
      PAD + (Math.min(share, this.end()) / this.end()) * (WIDTH - 2 * PAD);
    const known = (share: number | null): number | null => (share === null ? null : at(share));
    return {
      counted: known(counted),
      all: known(all),
      steadied: at(steadied),
      lower: at(lower),
      upper: at(upper),
    };
  });

  protected diamond(x: number): string {
    return `M${x} ${this.middle - 5}l5 5l-5 5l-5 -5z`;
  }
}
