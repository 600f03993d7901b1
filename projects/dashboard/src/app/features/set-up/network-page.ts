import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { RouterLink } from '@angular/router';
import { getCosts } from '#shared/contracts/set-up';
import { getNetwork } from '#shared/contracts/set-up-help';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { formatShare } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { ChangeForm } from '../../ui/set-up/change-form';
import { type DatedCost, DatedCosts } from '../../ui/set-up/dated-costs';
import { feeChange, networkChange } from '../../ui/set-up/network-changes';
import { shareToType } from '../../ui/set-up/read-field';
import { WhoChanged } from './who-changed';

/** The network itself: name, currency, target, claim limit, and its fee by date. */
@Component({
  selector: 'us-network-page',
  imports: [ChangeForm, DatedCosts, LoadState, RouterLink, WhoChanged],
  templateUrl: './network-page.html',
  styleUrl: './part.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NetworkPage {
  private readonly api = inject(Api);
  protected readonly catalogue = inject(Catalogue);
  protected readonly network = this.api.read(getNetwork, () => ({}));
  protected readonly costs = this.api.read(getCosts, () => ({}));
  protected readonly today = computed(() => this.catalogue.today() ?? '');
  protected readonly networkForm = computed(() => {
    const network = this.network.value();
    return network && networkChange(this.api, network);
  });
  protected readonly feeForm = computed(() => feeChange(this.api, this.today()));
  protected readonly fees = computed((): readonly DatedCost[] =>
    (this.costs.value()?.fees ?? []).map(({ from, feeRate }) => ({
      from,
      text: formatShare(feeRate, decimalsOf(shareToType(feeRate))),
    })),
  );

  protected reload(): void {
    this.network.reload();
    this.costs.reload();
    this.catalogue.state.reload();
  }
}

function decimalsOf(text: string): number {
  return text.split('.')[1]?.length ?? 0;
}
