import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  DOCUMENT,
  inject,
  Injector,
  input,
  model,
} from '@angular/core';
import { exportProductNeed } from '#shared/contracts/exports';
import { getProductNeed } from '#shared/contracts/products';
import { Api } from '../../core/api/api';
import { CsvLink } from '../../core/api/csv-link';
import { Catalogue } from '../../core/catalogue/catalogue';
import { keepLive } from '../../core/live/keep-live';
import { ScopeState } from '../../core/scope-line/scope-state';
import { DataTable } from '../../ui/data-table/data-table';
import { DefinitionLink } from '../../ui/definition-link/definition-link';
import { formatDate, formatList } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { needView } from './need-series';
import { OrderList } from './order-list';
import type { ProductWords } from './product-words';

/** More branches than this are counted, not named, on the printed list. */
const MOST_NAMES = 4;

/** What the coming eight weeks are expected to take, as a list to order from: on screen, as CSV, on paper. */
@Component({
  selector: 'us-coming-need',
  imports: [CsvLink, DataTable, DefinitionLink, LoadState, OrderList],
  templateUrl: './coming-need.html',
  styleUrl: './coming-need.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ComingNeed {
  readonly words = input.required<ProductWords>();
  /** What the printer gets: the page, or this list alone. */
  readonly onPaper = model<'page' | 'list'>('page');

  private readonly injector = inject(Injector);
  private readonly catalogue = inject(Catalogue);
  private readonly window = inject(DOCUMENT).defaultView;
  protected readonly scope = inject(ScopeState);

  protected readonly need = keepLive(
    inject(Api).read(getProductNeed, () => {
      const query = this.scope.query();
      return query && { query };
    }),
    'jobs',
  );
  protected readonly view = computed(() => {
    const answer = this.need.value();
    return answer && needView(answer, this.words());
  });
  protected readonly whose = computed(() => {
    const branches = this.need.value()?.scope.branches ?? [];
    return branches.length > MOST_NAMES
      ? `${branches.length} branches`
      : formatList(branches.map((code) => this.words().branchName(code)));
  });
  protected readonly on = computed(() => {
    const today = this.catalogue.today();
    return today ? formatDate(today) : '';
  });
  protected readonly export = exportProductNeed;

  /** Prints once the list stands alone; the page is back when the printer's dialog is gone. */
  protected printList(): void {
    const window = this.window;
    this.onPaper.set('list');
    window?.addEventListener('afterprint', () => this.onPaper.set('page'), { once: true });
    afterNextRender(() => window?.print(), { injector: this.injector });
  }
}
