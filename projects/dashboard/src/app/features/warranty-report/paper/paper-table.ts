import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { ScrollRegion } from '../../../ui/scroll-region/scroll-region';
import type { PaperRows } from './paper-rows';

/** A table of the report, as it stands: no sorting, its head on every printed page. */
@Component({
  selector: 'us-paper-table',
  imports: [ScrollRegion],
  template: `
    <us-scroll-region [label]="label()">
      <table [attr.aria-label]="label()">
        <thead>
          <tr>
            @for (column of of().columns; track $index) {
              <th scope="col" [class.number]="column.kind === 'number'">{{ column.label }}</th>
            }
          </tr>
        </thead>
        <tbody>
          @for (row of of().rows; track $index) {
            <tr>
              @for (cell of row; track $index; let first = $first) {
                @if (first) {
                  <th scope="row">{{ cell }}</th>
                } @else {
                  <td [class.number]="isNumber($index)">{{ cell }}</td>
                }
              }
            </tr>
          }
        </tbody>
        @if (of().total; as total) {
          <tfoot>
            <tr>
              @for (cell of total; track $index; let first = $first) {
                @if (first) {
                  <th scope="row">{{ cell }}</th>
                } @else {
                  <td [class.number]="isNumber($index)">{{ cell }}</td>
                }
              }
            </tr>
          </tfoot>
        }
      </table>
    </us-scroll-region>
  `,
  styleUrl: './paper-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PaperTable {
  /** What the table shows, for those who hear it. */
  readonly label = input.required<string>();
  readonly of = input.required<PaperRows>();

  protected isNumber(index: number): boolean {
    return this.of().columns[index]?.kind === 'number';
  }
}
