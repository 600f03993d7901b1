import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { type ChangeRow, isNothing } from './change-rows';

/** What changed, a field a row: what it is, what stood there before, what stands there after. */
@Component({
  selector: 'us-change-table',
  template: `
    <table [attr.aria-label]="label()">
      <thead>
        <tr>
          <th scope="col">Field</th>
          <th scope="col">Before</th>
          <th scope="col">After</th>
        </tr>
      </thead>
      <tbody>
        @for (row of rows(); track row.path) {
          <tr>
            <th scope="row">{{ row.field }}</th>
            <td [class.us-quiet]="isNothing(row.before)">{{ row.before }}</td>
            <td [class.us-quiet]="isNothing(row.after)">{{ row.after }}</td>
          </tr>
        }
      </tbody>
    </table>
  `,
  styleUrl: './change-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ChangeTable {
  readonly label = input.required<string>();
  readonly rows = input.required<readonly ChangeRow[]>();
  protected readonly isNothing = isNothing;
}
