import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  viewChild,
} from '@angular/core';
import { getNormMedians } from '#shared/contracts/set-up-help';
import type { BodyType } from '#shared/domain/vocabulary';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { formatCars, formatDateRange } from '../format';
import { BODY_TYPE_PLURALS } from '../words';
import { ChangeForm } from './change-form';
import { normChange } from './norm-changes';
import type { Package } from './package-changes';

/** The norm of a package on one body type, with what the network itself used offered beside each product. */
@Component({
  selector: 'us-norm-form',
  imports: [ChangeForm],
  template: `
    <p class="us-small us-quiet">
      Norms are not dated: a new norm restates all history. A product left empty is not expected.
    </p>
    <p class="us-small us-quiet" aria-live="polite">{{ known() }}</p>
    @if (form(); as form) {
      <us-change-form [of]="form" (saved)="took()" />
    } @else {
      <p>A norm is made of products, and there is none yet.</p>
    }
  `,
  styles: `
    p {
      margin-bottom: 8px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NormForm {
  readonly sold = input.required<Package>();
  readonly bodyType = input.required<BodyType>();
  readonly saved = output();

  private readonly changeForm = viewChild(ChangeForm);
  /** Something is typed that is not saved. */
  readonly unsaved = computed(() => this.changeForm()?.unsaved() ?? false);
  private readonly api = inject(Api);
  private readonly catalogue = inject(Catalogue);
  private readonly medians = this.api.read(getNormMedians, () => ({
    params: { code: this.sold().code, bodyType: this.bodyType() },
  }));
  protected readonly known = computed(() => {
    const medians = this.medians.value();
    if (!medians)
      return this.medians.problem() ? 'What the network used is not known just now.' : '';
    const { cars, from, to } = medians;
    const bodies = BODY_TYPE_PLURALS[this.bodyType()];
    const during = formatDateRange(from, to);
    return cars === 0
      ? `No ${bodies} with this package were finished ${during}.`
      : `What the network used: ${formatCars(cars)}, ${bodies}, finished ${during}.`;
  });
  protected readonly form = computed(() => {
    const products = this.catalogue.value()?.products ?? [];
    if (products.length === 0) return undefined;
    const sold = this.sold();
    const bodyType = this.bodyType();
    const norms = this.catalogue.normsOf(sold.code, bodyType);
    return normChange(this.api, { sold, bodyType, products, norms, medians: this.medians.value() });
  });

  protected took(): void {
    this.catalogue.state.reload();
    this.saved.emit();
  }
}
