import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { formatList } from '../../ui/format';
import { ChangeForm } from '../../ui/set-up/change-form';
import { addPersonChange } from '../../ui/set-up/person-changes';
import { ROLE_NAMES } from '../../ui/words';
import { KnownNetwork } from './known-network';

/** The people of the branch. */
@Component({
  selector: 'us-people-step',
  imports: [ChangeForm],
  template: `
    @if (there(); as names) {
      <p class="there">There already: {{ names }}.</p>
    }
    <us-change-form [of]="form()" (saved)="known.reload()" />
  `,
  styleUrl: './step.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PeopleStep {
  private readonly api = inject(Api);
  private readonly catalogue = inject(Catalogue);
  protected readonly known = inject(KnownNetwork);
  protected readonly there = computed(() =>
    formatList(
      (this.known.people.value()?.items ?? []).map(
        ({ name, role }) => `${name} (${ROLE_NAMES[role]})`,
      ),
    ),
  );
  protected readonly form = computed(() =>
    addPersonChange(this.api, {
      regions: this.catalogue.regions(),
      branches: this.catalogue.branches(),
    }),
  );
}
