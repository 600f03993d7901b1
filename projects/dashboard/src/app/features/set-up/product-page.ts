import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import { getCosts } from '#shared/contracts/set-up';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { formatExactMoney } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { ChangeForm } from '../../ui/set-up/change-form';
import { DatedCosts } from '../../ui/set-up/dated-costs';
import { firstOpening, productChange, productCostChange } from '../../ui/set-up/product-changes';
import { Removal } from './removal';
import { WhoChanged } from './who-changed';

/** One product: name, kind, and what a litre costs by date. */
@Component({
  selector: 'us-product-set-up-page',
  imports: [ChangeForm, DatedCosts, LoadState, Removal, RouterLink, WhoChanged],
  templateUrl: './product-page.html',
  styleUrl: './part.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProductSetUpPage {
  /** From the address. */
  readonly code = input.required<string>();

  private readonly api = inject(Api);
  private readonly router = inject(Router);
  protected readonly catalogue = inject(Catalogue);
  protected readonly costs = this.api.read(getCosts, () => ({}));
  protected readonly today = computed(() => this.catalogue.today() ?? '');
  protected readonly product = computed(() =>
    this.catalogue.value()?.products.find(({ code }) => code === this.code()),
  );
  protected readonly form = computed(() => {
    const product = this.product();
    return product && productChange(this.api, [], product);
  });
  /** The first cost counts from when the first branch opened, so that no car before it is without one. */
  protected readonly costForm = computed(() => {
    const first = this.rows().length === 0 ? firstOpening(this.catalogue.branches()) : undefined;
    return productCostChange(this.api, this.code(), first ?? this.today());
  });
  protected readonly rows = computed(() =>
    (this.costs.value()?.products ?? [])
      .filter(({ product }) => product === this.code())
      .map(({ from, costPerLitreCents }) => ({
        from,
        text: formatExactMoney(costPerLitreCents, this.catalogue.currency()),
      })),
  );

  protected async leave(): Promise<void> {
    this.catalogue.state.reload();
    await this.router.navigate(['/set-up/products']);
  }
}
