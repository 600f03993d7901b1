import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { Api } from '../../core/api/api';
import { ChangeForm } from '../../ui/set-up/change-form';
import { networkChange } from '../../ui/set-up/network-changes';
import { KnownNetwork } from './known-network';

/** Name, currency and fee of the network. */
@Component({
  selector: 'us-network-step',
  imports: [ChangeForm],
  template: `
    @if (form(); as form) {
      <us-change-form [of]="form" (saved)="known.reload()" />
    }
  `,
  styleUrl: './step.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NetworkStep {
  private readonly api = inject(Api);
  protected readonly known = inject(KnownNetwork);
  protected readonly form = computed(() => {
    const network = this.known.network.value();
    return network && networkChange(this.api, network);
  });
}
