import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { hatchWords } from '../text-width';

/** Too few cars in place of a row's mark: hatching over the plot, and words in its middle on plain ground. */
@Component({
  selector: 'g[us-too-few]',
  template: `
    <svg:rect
      [attr.fill]="hatch()"
      [attr.x]="from()"
      [attr.y]="y() - height() / 2"
      [attr.width]="to() - from()"
      [attr.height]="height()"
    />
    @if (text()) {
      <svg:rect
        class="ground"
        height="20"
        [attr.x]="middle() - words() / 2"
        [attr.y]="y() - 10"
        [attr.width]="words()"
      />
      <svg:text class="quiet" text-anchor="middle" [attr.x]="middle()" [attr.y]="y()">
        {{ text() }}
      </svg:text>
    }
  `,
  styleUrl: './too-few.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TooFew {
  /** Fill of the hatching. */
  readonly hatch = input.required<string>();
  /** Both ends of the plot, px. */
  readonly from = input.required<number>();
  readonly to = input.required<number>();
  /** Middle of the row. */
  readonly y = input.required<number>();
  readonly height = input(16);
  /** Empty where there is no room for words. */
  readonly text = input.required<string>();

  protected readonly middle = computed(() => (this.from() + this.to()) / 2);
  protected readonly words = computed(() => hatchWords(this.text()));
}
