import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { branchChange, rateChange } from '../../ui/set-up/branch-changes';
import { ChangeForm } from '../../ui/set-up/change-form';
import { KnownNetwork } from './known-network';

/** The first branch, then what an hour costs there. */
@Component({
  selector: 'us-branch-step',
  imports: [ChangeForm],
  template: `
    @if (waiting(); as branch) {
      <p class="there">{{ branch.name }} is there. Now what an hour of work costs it.</p>
      <us-change-form [of]="rateForm()" (saved)="known.reload()" />
    } @else if (known.soFar().regions === 0) {
      <p>A branch lies in a region: add one first, the step before this.</p>
    } @else {
      @if (known.soFar().branches > 0) {
        <p class="there">
          There already, with an hourly cost: {{ known.soFar().branchesWithRate }}. Another one:
        </p>
      }
      <us-change-form [of]="form()" (saved)="known.reload()" />
    }
  `,
  styleUrl: './step.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BranchStep {
  private readonly api = inject(Api);
  private readonly catalogue = inject(Catalogue);
  protected readonly known = inject(KnownNetwork);
  /** The first branch whose hourly cost is not known yet. */
  protected readonly waiting = computed(() => {
    const rates = this.known.costs.value()?.rates;
    return (
      rates &&
      this.catalogue.branches().find(({ code }) => !rates.some(({ branch }) => branch === code))
    );
  });
  protected readonly form = computed(() =>
    branchChange(this.api, {
      regions: this.catalogue.regions(),
      taken: this.catalogue.branches().map(({ code }) => code),
    }),
  );
  protected readonly rateForm = computed(() => {
    const branch = this.waiting();
    return rateChange(this.api, branch?.code ?? '', branch?.openedOn ?? '');
  });
}
