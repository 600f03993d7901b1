import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router } from '@angular/router';
import {
  dropUnderWay,
  getUnderWay,
  type JobUnderWay,
  listUnderWay,
} from '#shared/contracts/under-way';
import { Api } from '../../../core/api/api';
import { deed } from '../../../core/api/deed';
import { Drafts } from '../../../core/drafts/drafts';
import { Line } from '../../../core/offline/line';
import { formatCounted, formatInstant } from '../../../ui/format';
import { LoadState } from '../../../ui/load-state/load-state';
import { Trouble } from '../../../ui/trouble/trouble';
import { carWords } from '../review-words';

/** Jobs that colleagues of the branch keep on the server; anyone of them goes on. */
@Component({
  selector: 'us-under-way-rows',
  imports: [LoadState, MatButton, Trouble],
  templateUrl: './under-way-rows.html',
  styleUrl: './job-rows.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UnderWayRows {
  readonly branch = input.required<string>();

  private readonly api = inject(Api);
  private readonly drafts = inject(Drafts);
  private readonly router = inject(Router);
  protected readonly jobs = this.api.read(listUnderWay, () => ({
    params: { branch: this.branch() },
  }));
  protected readonly rows = computed(() =>
    (this.jobs.value()?.items ?? [])
      // What is being gone on with here stands above already.
      .filter(({ jobRef }) => !this.continuedHere(jobRef))
      .map((job) => ({
        job,
        title: [carWords(job.content), `job ${job.jobRef}`].filter(Boolean).join(', '),
        words: [
          `${job.changedBy}, ${formatInstant(job.changedAt)}`,
          ...(job.photos > 0 ? [formatCounted(job.photos, 'photo', 'photos')] : []),
        ].join(', '),
      })),
  );
  /** Whether those kept are all being gone on with here. */
  protected readonly onlyHere = computed(() => (this.jobs.value()?.items ?? []).length > 0);
  protected readonly goingOn = deed((job: JobUnderWay) =>
    this.api.call(getUnderWay, { params: { branch: this.branch(), jobRef: job.jobRef } }),
  );
  /** The one asked about before it is dropped. */
  protected readonly asked = signal<string | undefined>(undefined);
  protected readonly dropping = deed((job: JobUnderWay) =>
    this.api.call(dropUnderWay, { params: { branch: this.branch(), jobRef: job.jobRef } }),
  );

  constructor() {
    const line = inject(Line);
    // What could not be read without a line is read when it is back, not only when somebody asks.
    effect(() => {
      if (!line.down() && untracked(() => this.jobs.problem()) !== undefined) this.jobs.reload();
    });
  }

  protected async goOn(job: JobUnderWay): Promise<void> {
    const answer = await this.goingOn.run(job);
    if (!answer) return;
    const { jobRef, content } = answer.body;
    const draft = await this.drafts
      .begin(this.branch(), { jobRef, content, keptAs: answer.etag })
      .catch(() => undefined);
    if (draft) await this.router.navigate(['/send', draft.id]);
  }

  protected async drop(job: JobUnderWay): Promise<void> {
    if (this.asked() !== job.jobRef) {
      this.asked.set(job.jobRef);
      return;
    }
    this.asked.set(undefined);
    if (await this.dropping.run(job)) this.jobs.reload();
  }

  private continuedHere(jobRef: string): boolean {
    return this.drafts
      .list()
      .some(
        (draft) =>
          draft.branch === this.branch() && draft.jobRef === jobRef && draft.keptAs !== undefined,
      );
  }
}
