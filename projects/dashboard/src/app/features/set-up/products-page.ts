import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { Router } from '@angular/router';
import { getCosts } from '#shared/contracts/set-up';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import type { Column } from '../../ui/data-table/column';
import { DataTable } from '../../ui/data-table/data-table';
import { formatExactMoney } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { ChangeForm } from '../../ui/set-up/change-form';
import { costOfDay } from '../../ui/set-up/dated-costs';
import { type Product, productChange } from '../../ui/set-up/product-changes';
import { PRODUCT_KIND_NAMES } from '../../ui/words';
import { WhoChanged } from './who-changed';

/** The products, and the way to a new one. */
@Component({
  selector: 'us-products-page',
  imports: [ChangeForm, DataTable, LoadState, WhoChanged],
  templateUrl: './products-page.html',
  styleUrl: './part.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProductsPage {
  private readonly api = inject(Api);
  private readonly router = inject(Router);
  protected readonly catalogue = inject(Catalogue);
  private readonly costs = this.api.read(getCosts, () => ({}));
  protected readonly products = computed(() => this.catalogue.value()?.products ?? []);
  protected readonly columns = computed((): Column<Product>[] => [
    {
      key: 'name',
      label: 'Product',
      text: ({ name }) => name,
      quiet: ({ code }) => code,
      link: ({ code }) => ({ commands: ['/set-up/products', code] }),
    },
    { key: 'kind', label: 'Kind', text: ({ kind }) => PRODUCT_KIND_NAMES[kind] },
    {
      key: 'cost',
      label: 'A litre costs',
      kind: 'number',
      text: ({ code }) => {
        const cents = this.costOf(code);
        return cents === undefined
          ? 'not known'
          : formatExactMoney(cents, this.catalogue.currency());
      },
      muted: ({ code }) => this.costOf(code) === undefined,
    },
  ]);
  protected readonly form = computed(() =>
    productChange(
      this.api,
      this.products().map(({ code }) => code),
    ),
  );

  /** On to the new product's own page, where its cost is asked for. */
  protected async added({ code }: Product): Promise<void> {
    this.catalogue.state.reload();
    await this.router.navigate(['/set-up/products', code]);
  }

  private costOf(code: string): number | undefined {
    const costs = (this.costs.value()?.products ?? []).filter(({ product }) => product === code);
    return costOfDay(costs, this.catalogue.today() ?? '')?.costPerLitreCents;
  }
}
