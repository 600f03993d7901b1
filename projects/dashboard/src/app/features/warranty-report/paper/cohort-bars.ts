import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { WarrantyAnswer } from '#shared/contracts/warranty';
import { giveOrTake } from '#shared/domain/give-or-take';
import { PaidCell } from '../../../charts/paid-and-to-come/paid-cell';
import { paidReach } from '../../../charts/paid-and-to-come/paid-cell-layout';
import { formatAmount } from '../../../ui/format';
import { ScrollRegion } from '../../../ui/scroll-region/scroll-region';
import { giveOrTakeWords, halfYearWords } from '../report-words';

/** What was paid and is still to come, a bar a half-year with its numbers beside it. */
@Component({
  selector: 'us-cohort-bars',
  imports: [PaidCell, ScrollRegion],
  template: `
    <us-scroll-region label="Paid, and still to come, drawn">
      <table aria-label="Paid, and still to come, drawn">
        <thead>
          <tr>
            <th scope="col">Finished in</th>
            <th scope="col" class="number">Paid</th>
            <td></td>
            <th scope="col" class="number">Still to come</th>
            <th scope="col" class="number">Give or take</th>
          </tr>
        </thead>
        <tbody>
          @for (row of bars().rows; track row.name) {
            <tr>
              <th scope="row">{{ row.name }}</th>
              <td class="number">{{ row.paid }}</td>
              <td class="bar"><us-paid-cell [data]="row.bar" [reach]="bars().reach" /></td>
              <td class="number strong">{{ row.toCome }}</td>
              <td class="number us-quiet">{{ row.giveOrTake }}</td>
            </tr>
          }
        </tbody>
      </table>
    </us-scroll-region>
  `,
  styles: `
    :host {
      display: block;
    }
    table {
      width: 100%;
      border-collapse: collapse;
      font-size: 14px;
      line-height: 20px;
      font-variant-numeric: tabular-nums;
    }
    th,
    td {
      padding: 4px 0 4px 10px;
      font-weight: 400;
      text-align: start;
    }
    th:first-child {
      padding-inline-start: 0;
    }
    thead > tr > * {
      border-bottom: 1px solid var(--us-ink);
      color: var(--us-quiet);
      font-weight: 500;
      vertical-align: bottom;
    }
    tbody tr + tr > * {
      border-top: 1px solid var(--us-hairline);
    }
    .number {
      text-align: end;
      white-space: nowrap;
    }
    thead .number {
      white-space: normal;
    }
    .strong {
      font-weight: 600;
    }
    .bar {
      width: 50%;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CohortBars {
  readonly answer = input.required<WarrantyAnswer>();

  protected readonly bars = computed(() => {
    const rows = this.answer().cohorts.map(
      ({ cohort, latestCents, outstandingCents, standardErrorCents }) => ({
        name: halfYearWords(cohort),
        paid: formatAmount(latestCents),
        toCome: formatAmount(outstandingCents),
        giveOrTake: giveOrTakeWords(standardErrorCents),
        bar: {
          paid: latestCents,
          toCome: outstandingCents,
          giveOrTake: standardErrorCents === null ? null : giveOrTake(standardErrorCents),
        },
      }),
    );
    return { rows, reach: paidReach(rows.map(({ bar }) => bar)) };
  });
}
