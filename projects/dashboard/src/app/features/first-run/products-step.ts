import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { formatList } from '../../ui/format';
import { ChangeForm } from '../../ui/set-up/change-form';
import { firstOpening, productChange, productCostChange } from '../../ui/set-up/product-changes';
import { KnownNetwork } from './known-network';

/** Products one after the other, each with what a litre costs. */
@Component({
  selector: 'us-products-step',
  imports: [ChangeForm],
  template: `
    @if (priced(); as names) {
      <p class="there">There, with their cost: {{ names }}.</p>
    }
    @if (waiting(); as product) {
      <p class="there">{{ product.name }} is there. Now what a litre of it costs.</p>
      <us-change-form [of]="costForm()" (saved)="known.reload()" />
    } @else {
      <h3>{{ priced() ? 'Another product' : 'The first product' }}</h3>
      <us-change-form [of]="form()" (saved)="known.reload()" />
    }
  `,
  styleUrl: './step.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProductsStep {
  private readonly api = inject(Api);
  private readonly catalogue = inject(Catalogue);
  protected readonly known = inject(KnownNetwork);
  private readonly products = computed(() => this.catalogue.value()?.products ?? []);
  private readonly withCost = computed(
    () => new Set(this.known.costs.value()?.products.map(({ product }) => product)),
  );
  protected readonly priced = computed(() =>
    formatList(
      this.products()
        .filter(({ code }) => this.withCost().has(code))
        .map(({ name }) => name),
    ),
  );
  protected readonly waiting = computed(() =>
    this.products().find(({ code }) => !this.withCost().has(code)),
  );
  protected readonly form = computed(() =>
    productChange(
      this.api,
      this.products().map(({ code }) => code),
    ),
  );
  protected readonly costForm = computed(() => {
    const from = firstOpening(this.catalogue.branches()) ?? this.catalogue.today() ?? '';
    return productCostChange(this.api, this.waiting()?.code ?? '', from);
  });
}
