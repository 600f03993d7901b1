import {
  afterRenderEffect,
  ChangeDetectionStrategy,
  Component,
  computed,
  type ElementRef,
  inject,
  input,
  linkedSignal,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { LoadState } from '../../ui/load-state/load-state';
import { Progress } from '../../ui/progress/progress';
import { BranchStep } from './branch-step';
import { firstOpen, firstSteps, stepAfter, STEP_KEYS, type StepKey } from './first-steps';
import { JobStep } from './job-step';
import { KnownNetwork } from './known-network';
import { NetworkStep } from './network-step';
import { PackageStep } from './package-step';
import { PeopleStep } from './people-step';
import { ProductsStep } from './products-step';
import { RegionStep } from './region-step';

/** From nothing to the first branch and the first job, one step after the other; what is done is seen from the data. */
@Component({
  selector: 'us-first-run-page',
  imports: [
    BranchStep,
    JobStep,
    LoadState,
    MatButton,
    NetworkStep,
    PackageStep,
    PeopleStep,
    ProductsStep,
    Progress,
    RegionStep,
    RouterLink,
  ],
  templateUrl: './first-run-page.html',
  styleUrl: './first-run-page.scss',
  providers: [KnownNetwork],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FirstRunPage {
  /** The step asked for, from the address. */
  readonly step = input<string>();

  protected readonly known = inject(KnownNetwork);
  private readonly heading = viewChild<ElementRef<HTMLElement>>('heading');
  protected readonly steps = computed(() => firstSteps(this.known.soFar()));
  /** Where one came in; it stays while that step gets done, so that nothing jumps away from under the hand. */
  private readonly begun = linkedSignal<boolean, StepKey | undefined>({
    source: () => this.known.state.value() !== undefined,
    computation: (ready, before) => before?.value ?? (ready ? firstOpen(this.steps()) : undefined),
  });
  protected readonly open = computed(() => {
    const key = STEP_KEYS.find((one) => one === this.step()) ?? this.begun();
    return this.steps().find((one) => one.key === key);
  });
  protected readonly next = computed(() => {
    const open = this.open();
    return open && stepAfter(this.steps(), open.key);
  });
  protected readonly done = computed(() => this.steps().filter(({ done }) => done).length);
  protected readonly words = computed(() => `${this.done()} of ${this.steps().length} done`);
  private shown: StepKey | undefined;

  constructor() {
    // Going on to another step is like turning a page: reading begins at its heading.
    afterRenderEffect(() => {
      const key = this.open()?.key;
      if (key === undefined) return;
      if (this.shown !== undefined && this.shown !== key) this.heading()?.nativeElement.focus();
      this.shown = key;
    });
  }
}
