import {
  ChangeDetectionStrategy,
  Component,
  effect,
  inject,
  input,
  untracked,
} from '@angular/core';
import { Router } from '@angular/router';
import { getJob, type JobSheet } from '#shared/contracts/jobs';
import { Api } from '../../core/api/api';
import { Drafts } from '../../core/drafts/drafts';
import { LoadState } from '../../ui/load-state/load-state';
import { draftOfJob } from './draft-of-job';

/** A job on record taken into the form to be corrected; a correction begun before is gone on with. */
@Component({
  selector: 'us-correct-page',
  imports: [LoadState],
  template: ` <div class="us-column"><us-load-state [of]="job" /></div> `,
  styles: `
    div {
      padding-top: 24px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CorrectPage {
  // From the address.
  readonly branch = input.required<string>();
  readonly jobRef = input.required<string>();

  private readonly drafts = inject(Drafts);
  private readonly router = inject(Router);
  protected readonly job = inject(Api).read(getJob, () => ({
    params: { branch: this.branch(), jobRef: this.jobRef() },
  }));
  private isTaken = false;

  constructor() {
    effect(() => {
      const job = this.job.value();
      const etag = this.job.etag();
      if (!job || !etag || !this.drafts.ready() || this.isTaken) return;
      this.isTaken = true;
      untracked(() => void this.take(job, etag));
    });
  }

  private async take(job: JobSheet, etag: string): Promise<void> {
    const begun = this.drafts
      .list()
      .find(
        (draft) =>
          draft.branch === job.branch &&
          draft.jobRef === job.jobRef &&
          draft.corrects !== undefined &&
          draft.state !== 'sent',
      );
    const draft =
      begun ??
      (await this.drafts.begin(job.branch, {
        jobRef: job.jobRef,
        content: draftOfJob(job),
        corrects: etag,
        step: 6,
      }));
    // The job sheet, not this address, is what Back leads to.
    await this.router.navigate(['/send', draft.id], { replaceUrl: true });
  }
}
