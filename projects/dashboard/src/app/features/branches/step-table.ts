import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { StepCell } from '../../charts/step-cell/step-cell';
import { ScrollRegion } from '../../ui/scroll-region/scroll-region';
import type { SideBySide } from './side-by-side';

/** Branches side by side: from the reference over steps to each one's value, bars on one scale. */
@Component({
  selector: 'us-step-table',
  imports: [ScrollRegion, StepCell],
  template: `
    <us-scroll-region label="Branches side by side, in steps">
      <table aria-label="Branches side by side, in steps">
        <thead>
          <tr>
            <th scope="col"><span class="us-unseen">Step</span></th>
            @for (branch of of().branches; track branch.code) {
              <th scope="col" class="number">{{ branch.name }}</th>
            }
          </tr>
        </thead>
        <tbody>
          @for (row of of().rows; track row.key) {
            <tr [class.total]="row.kind !== 'step'" [class.sum]="row.kind === 'sum'">
              <th scope="row">{{ row.label }}</th>
              @for (text of row.texts; track $index) {
                <td class="number">
                  <span class="cell">
                    @if (row.kind === 'step' && row.values[$index] !== null) {
                      <us-step-cell [value]="row.values[$index]!" [reach]="of().reach" />
                    }
                    <span class="text">{{ text }}</span>
                  </span>
                </td>
              }
            </tr>
          }
        </tbody>
      </table>
    </us-scroll-region>
  `,
  styleUrl: './step-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StepTable {
  readonly of = input.required<SideBySide>();
}
