import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { RowFrame } from '../row-frame';

/** The value axis of a picture of rows: a hairline at each mark beside or behind the rows, the marks' words over them. */
@Component({
  selector: 'g[us-value-marks]',
  template: `
    @for (guide of guides(); track $index) {
      @for (mark of marks(); track mark.value) {
        <svg:line
          class="hairline"
          [attr.x1]="mark.x"
          [attr.x2]="mark.x"
          [attr.y1]="guide.from"
          [attr.y2]="guide.to"
        />
      }
      @if (reference() !== null) {
        <svg:line
          class="expected"
          [attr.x1]="reference()"
          [attr.x2]="reference()"
          [attr.y1]="guide.from"
          [attr.y2]="guide.to"
        />
      }
    }
    @for (mark of marks(); track mark.value) {
      <svg:text
        text-anchor="middle"
        y="10"
        [attr.class]="mark.value === expected() ? 'tide' : 'quiet'"
        [attr.x]="mark.wordX"
      >
        {{ mark.text }}
      </svg:text>
    }
  `,
  styleUrl: './piece.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ValueMarks {
  readonly marks = input.required<RowFrame['marks']>();
  /** Heights between which the hairlines run. */
  readonly guides = input.required<RowFrame['guides']>();
  /** Place of a line for what is expected, over the hairlines; null for none. */
  readonly reference = input<number | null>(null);
  /** Value of the mark whose word has the colour of what is expected. */
  readonly expected = input<number>();
}
