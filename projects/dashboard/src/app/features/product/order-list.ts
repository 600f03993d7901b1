import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { NeedView } from './need-series';

/** The coming need on paper: a line a product, with room for what is on the shelf and what was ordered. Seen in print only. */
@Component({
  selector: 'us-order-list',
  template: `
    <h1>What to order, {{ whose() }}</h1>
    <p>For {{ need().coming }}. {{ need().from }} Printed {{ on() }}.</p>
    <table>
      <thead>
        <tr>
          <th scope="col">Product</th>
          <th scope="col" class="number">Expected</th>
          <th scope="col" class="number">95 times of 100</th>
          <th scope="col" class="number">Cost</th>
          <th scope="col" class="room">On the shelf</th>
          <th scope="col" class="room">Ordered</th>
        </tr>
      </thead>
      <tbody>
        @for (line of need().printed; track line.product) {
          <tr>
            <td>{{ line.name }}</td>
            <td class="number strong">{{ line.expected }}</td>
            <td class="number">{{ line.range }}</td>
            <td class="number">{{ line.cost }}</td>
            <td class="room"><span></span></td>
            <td class="room"><span></span></td>
          </tr>
        }
      </tbody>
      @if (need().totalCost; as cost) {
        <tfoot>
          <tr>
            <td colspan="3">all</td>
            <td class="number">{{ cost }}</td>
            <td colspan="2"></td>
          </tr>
        </tfoot>
      }
    </table>
    @for (sentence of need().outside; track sentence) {
      <p>{{ sentence }}</p>
    }
  `,
  styles: `
    h1 {
      font-size: 20px;
      line-height: 30px;
      font-weight: 600;
    }
    p {
      max-width: 640px;
      margin-top: 6px;
    }
    table {
      width: 100%;
      margin-top: 16px;
      border-collapse: collapse;
      font-variant-numeric: tabular-nums;
    }
    th {
      font-weight: 500;
      border-bottom: 1px solid var(--us-ink);
    }
    th,
    td {
      padding: 8px 7px;
      text-align: start;
    }
    td {
      border-bottom: 1px solid var(--us-hairline);
    }
    th:first-child,
    td:first-child {
      padding-inline-start: 0;
    }
    tfoot td {
      font-weight: 600;
      border-top: 1px solid var(--us-ink);
      border-bottom: 0;
    }
    .number {
      text-align: end;
      white-space: nowrap;
    }
    .strong {
      font-weight: 600;
    }
    .room {
      width: 110px;
      padding-inline-start: 20px;
    }
    .room span {
      display: block;
      height: 20px;
      border-bottom: 1px solid var(--us-ink);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OrderList {
  readonly need = input.required<NeedView>();
  /** Branch or branches, in words. */
  readonly whose = input.required<string>();
  /** The day of printing, in words. */
  readonly on = input.required<string>();
}
