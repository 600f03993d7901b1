import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { Hatch } from '../pieces/hatch';
import type { PaidCellInput } from './paid-cell-input';
import { layOutPaidCell } from './paid-cell-layout';

/**
 * Paid and still to come as a bar in a table's cell: solid, then hatched with an outline, and a whisker over its end. Its numbers
 * stand in the same row, so it is not heard.
 */
@Component({
  selector: 'us-paid-cell',
  imports: [Hatch],
  template: `
    <svg width="100%" height="22" aria-hidden="true">
      <defs><pattern us-hatch #hatch="usHatch" [pitch]="6" [line]="2" /></defs>
      @if (bar(); as b) {
        <rect class="paid" x="0" y="4" height="14" [attr.width]="b.paid + '%'" />
        @if (b.toCome > 0) {
          <rect
            class="to-come"
            y="4.5"
            height="13"
            [attr.x]="b.paid + '%'"
            [attr.width]="b.toCome + '%'"
            [attr.fill]="hatch.fill"
          />
        }
        @if (b.whisker; as w) {
          <line class="whisker" y1="11" y2="11" [attr.x1]="w.from + '%'" [attr.x2]="w.to + '%'" />
          <line class="whisker" y1="7" y2="15" [attr.x1]="w.from + '%'" [attr.x2]="w.from + '%'" />
          <line class="whisker" y1="7" y2="15" [attr.x1]="w.to + '%'" [attr.x2]="w.to + '%'" />
        }
      }
    </svg>
  `,
  styleUrl: './paid-cell.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PaidCell {
  readonly data = input.required<PaidCellInput>();
  /** What the whole width of the cell stands for, the same in every row. */
  readonly reach = input.required<number>();

  protected readonly bar = computed(() => layOutPaidCell(this.data(), this.reach()));
}
