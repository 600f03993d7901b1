import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { Router, RouterLink } from '@angular/router';
import { Catalogue } from '../../core/catalogue/catalogue';
import { Drafts } from '../../core/drafts/drafts';
import { JobOutbox } from '../../core/drafts/outbox';
import { Session } from '../../core/session/session';
import { lackOf, nextSteps } from '../../ui/empty-next/next-steps';
import { LoadState } from '../../ui/load-state/load-state';
import { Trouble } from '../../ui/trouble/trouble';
import { DraftRows } from './pieces/draft-rows';
import { KeptLine } from './pieces/kept-line';
import { UnderWayRows } from './pieces/under-way-rows';

/** What is being written on this device and what colleagues have under way, and the beginning of the next job. */
@Component({
  selector: 'us-send-page',
  imports: [
    DraftRows,
    KeptLine,
    LoadState,
    MatButton,
    MatFormFieldModule,
    MatInput,
    RouterLink,
    Trouble,
    UnderWayRows,
  ],
  templateUrl: './send-page.html',
  styleUrl: './send-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SendPage {
  /** From the address: whose jobs. */
  readonly branch = input<string>();

  private readonly router = inject(Router);
  private readonly role = inject(Session).role;
  protected readonly catalogue = inject(Catalogue);
  protected readonly drafts = inject(Drafts);
  protected readonly outbox = inject(JobOutbox);
  protected readonly branches = this.catalogue.branches;
  /** The branch asked for, or the only one there is. */
  protected readonly chosen = computed(() => {
    const branches = this.branches();
    const asked = branches.find(({ code }) => code === this.branch())?.code;
    return asked ?? (branches.length === 1 ? branches[0]?.code : undefined);
  });
  /** What stands in the way of any job at all, and what this person can do about it. */
  protected readonly missing = computed(() => {
    const known = this.catalogue.value();
    const role = this.role();
    if (!known || !role) return undefined;
    const { branches, packages } = known;
    const lack = lackOf({ branches: branches.length, packages: packages.length, jobs: 1 });
    return lack && nextSteps(lack, role);
  });
  protected readonly isStuck = computed(() => {
    const { waiting, photosWaiting, sending } = this.outbox.state();
    return waiting + photosWaiting > 0 && !sending;
  });

  protected choose(branch: string): void {
    void this.router.navigate([], { queryParams: { branch }, queryParamsHandling: 'merge' });
  }

  protected async begin(): Promise<void> {
    const branch = this.chosen();
    if (branch === undefined) return;
    // What cannot be kept is said in the state line.
    const draft = await this.drafts.begin(branch).catch(() => undefined);
    if (draft) await this.router.navigate(['/send', draft.id]);
  }
}
