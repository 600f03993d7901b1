import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { formatList } from '../../ui/format';
import { ChangeForm } from '../../ui/set-up/change-form';
import { Corrosivity } from '../../ui/set-up/corrosivity';
import { type Climate, climateTyped, regionChange } from '../../ui/set-up/region-changes';
import { KnownNetwork } from './known-network';

/** The first region; its climate can be left for later. */
@Component({
  selector: 'us-region-step',
  imports: [ChangeForm, Corrosivity],
  template: `
    @if (there(); as names) {
      <p class="there">There already: {{ names }}. Another one:</p>
    }
    <div class="sides">
      <us-change-form [of]="form()" (typing)="climate.set(read($event))" (saved)="known.reload()" />
      <us-corrosivity [climate]="climate()" />
    </div>
  `,
  styleUrl: './step.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RegionStep {
  private readonly api = inject(Api);
  private readonly catalogue = inject(Catalogue);
  protected readonly known = inject(KnownNetwork);
  protected readonly read = climateTyped;
  protected readonly climate = signal<Climate | undefined>(undefined);
  protected readonly there = computed(() =>
    formatList(this.catalogue.regions().map(({ name }) => name)),
  );
  protected readonly form = computed(() => ({
    ...regionChange(
      this.api,
      this.catalogue.regions().map(({ code }) => code),
    ),
    after: 'clear' as const,
  }));
}
