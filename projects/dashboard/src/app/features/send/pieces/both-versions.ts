import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { getJob } from '#shared/contracts/jobs';
import { Api } from '../../../core/api/api';
import { Catalogue } from '../../../core/catalogue/catalogue';
import { Drafts } from '../../../core/drafts/drafts';
import { formatInstant } from '../../../ui/format';
import { LoadState } from '../../../ui/load-state/load-state';
import { differences } from '../both-versions';
import { draftOfJob } from '../draft-of-job';
import { OpenDraft } from '../open-draft';

/** Somebody changed the job meanwhile: both versions field by field, and which of them is to stand. */
@Component({
  selector: 'us-both-versions',
  imports: [LoadState, MatButton],
  templateUrl: './both-versions.html',
  styleUrl: './both-versions.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BothVersions {
  private readonly draft = inject(OpenDraft);
  private readonly drafts = inject(Drafts);
  private readonly catalogue = inject(Catalogue);
  protected readonly looking = signal(false);
  protected readonly job = inject(Api).read(getJob, () => {
    const kept = this.draft.kept();
    return kept && this.looking()
      ? { params: { branch: kept.branch, jobRef: kept.jobRef } }
      : undefined;
  });
  private readonly theirs = computed(() => {
    const job = this.job.value();
    return job && { ...draftOfJob(job), jobRef: job.jobRef };
  });
  protected readonly last = computed(() => {
    const revision = this.job.value()?.revisions.at(-1);
    return revision && `${revision.by}, ${formatInstant(revision.receivedAt)}`;
  });
  protected readonly rows = computed(() => {
    const theirs = this.theirs();
    if (!theirs) return [];
    return differences(this.draft.document(), theirs, (code) => this.catalogue.productName(code));
  });

  /** Mine is to stand: it becomes a correction of the job as it is now, and is sent from here as before. */
  protected async keepMine(): Promise<void> {
    await this.rebase();
  }

  /** Theirs is to stand: the draft begins anew from it. */
  protected async takeTheirs(): Promise<void> {
    const theirs = this.theirs();
    if (!theirs) return;
    this.draft.rewrite(() => theirs);
    await this.draft.flush();
    await this.rebase();
  }

  private async rebase(): Promise<void> {
    const id = this.draft.id();
    const corrects = this.job.etag();
    if (id !== undefined && corrects) await this.drafts.change(id, { corrects });
    this.looking.set(false);
  }
}
