import { LiveAnnouncer } from '@angular/cdk/a11y';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { getJob } from '#shared/contracts/jobs';
import { Api } from '../../core/api/api';
import type { Problem } from '../../core/api/problem';
import { Catalogue } from '../../core/catalogue/catalogue';
import type { ClaimDraft, ClaimDraftChange } from '../../core/drafts/claim-draft';
import { ClaimDrafts } from '../../core/drafts/claim-drafts';
import { Session } from '../../core/session/session';
import { deviceWord } from '../../ui/device-word';
import { formatCounted, formatDate } from '../../ui/format';
import { Progress } from '../../ui/progress/progress';
import { Trouble } from '../../ui/trouble/trouble';
import { ClaimFields } from './claim-fields';
import { ClaimForm } from './claim-form';
import { coverWords } from './claim-head';
import { ClaimPhotosHere } from './claim-photos-here';
import { sendClaim, type SentClaim } from './send-claim';
import { sendClaimPhotos } from './send-claim-photos';
import { claimBody, emptyClaim } from './typed-claim';

/** Records a claim on a job. What is written stays on this device until the server has it, photos and all. */
@Component({
  selector: 'us-new-claim-page',
  imports: [ClaimFields, ClaimPhotosHere, MatButton, Progress, RouterLink, Trouble],
  templateUrl: './new-claim-page.html',
  styleUrl: './new-claim-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NewClaimPage {
  private readonly api = inject(Api);
  private readonly router = inject(Router);
  private readonly announcer = inject(LiveAnnouncer);
  private readonly catalogue = inject(Catalogue);
  private readonly role = inject(Session).role;
  private readonly device = deviceWord();
  private readonly fields = viewChild(ClaimFields);
  protected readonly drafts = inject(ClaimDrafts);

  // From the path.
  readonly branch = input.required<string>();
  readonly jobRef = input.required<string>();

  protected readonly form = new ClaimForm();
  protected readonly place = computed(() => ({ branch: this.branch(), jobRef: this.jobRef() }));
  protected readonly job = this.api.read(getJob, () => ({ params: this.place() }));
  /** What the device keeps of it; nothing before the first word. */
  protected readonly draft = signal<ClaimDraft | undefined>(undefined);
  protected readonly ready = signal(false);
  protected readonly busy = signal<'no' | 'claim' | 'photos'>('no');
  protected readonly problem = signal<Problem | undefined>(undefined);

  protected readonly about = computed(() => {
    const job = this.job.value();
    if (!job) return undefined;
    const { make, model, firstRegistered } = job.vehicle;
    return {
      car: `${make} ${model} ${firstRegistered.slice(0, 4)}`,
      done: `${this.catalogue.packageName(job.package)}, finished ${formatDate(job.completedOn)}.`,
      cover: coverWords(job, this.form.typed().madeOn),
    };
  });
  protected readonly missing = computed(() => this.job.problem()?.status === 404);
  /** It may be there under its reference already: another would record it twice. */
  protected readonly fixed = computed(() =>
    this.draft()?.tried ? 'It went out under this one, so it stays.' : undefined,
  );
  protected readonly kept = computed(() => this.draft() !== undefined);
  protected readonly keptWords = computed(() =>
    this.kept() ? `Kept on this ${this.device()} until it is sent` : '',
  );
  protected readonly photos = computed(() => {
    const all = this.draft()?.photos ?? [];
    const gone = all.filter(({ state }) => state === 'sent').length;
    return { all: all.length, gone, left: all.length - gone };
  });
  protected readonly leftWords = computed(() =>
    formatCounted(this.photos().left, 'photo has not gone yet', 'photos have not gone yet'),
  );

  constructor() {
    effect(() => {
      const job = this.place();
      const today = this.catalogue.today();
      if (today !== undefined) void untracked(() => this.open(job, today));
    });
    effect(() => {
      const typed = this.form.typed();
      untracked(() => {
        if (this.ready() && this.form.group.dirty) void this.keep({ typed });
      });
    });
  }

  protected keptNow(draft: ClaimDraft | undefined): void {
    this.draft.set(draft);
  }

  protected async send(): Promise<void> {
    const role = this.role();
    if (this.busy() !== 'no' || !role) return;
    this.problem.set(undefined);
    const typed = this.form.typed();
    const read = claimBody(typed, this.jobRef(), role);
    if ('problems' in read) {
      this.form.mark(read.problems);
      this.lookAtWrong();
      return;
    }
    this.busy.set('claim');
    await this.keep({ typed });
    const sent = await sendClaim(
      this.api,
      {
        branch: this.branch(),
        claimRef: typed.claimRef.trim(),
        body: read.body,
        tried: this.draft()?.tried,
      },
      (tried) => this.keep({ tried }),
    );
    this.busy.set('no');
    await this.ended(sent);
  }

  /** Sends what is left of the photos, and goes to the claim once all are there. */
  protected async sendPhotos(): Promise<void> {
    const draft = this.draft();
    if (this.busy() !== 'no' || draft?.sentAs === undefined) return;
    this.problem.set(undefined);
    this.busy.set('photos');
    const problem = await sendClaimPhotos(this.api, this.drafts, draft, (now) => this.keptNow(now));
    this.busy.set('no');
    this.problem.set(problem);
    if (!problem && this.photos().left === 0) await this.leave(draft.sentAs);
  }

  /** Goes to the claim; photos that did not go are left out. */
  protected async leave(claimRef: string): Promise<void> {
    await this.drafts.forget(this.place());
    const said = `Claim ${claimRef} recorded.`;
    void this.announcer.announce(said);
    await this.router.navigate(['/claims', this.branch(), claimRef], {
      replaceUrl: true,
      state: { said },
    });
  }

  protected async throwAway(): Promise<void> {
    await this.drafts.forget(this.place());
    await this.router.navigate(['/jobs', this.branch(), this.jobRef()]);
  }

  private async open(job: { branch: string; jobRef: string }, today: string): Promise<void> {
    if (this.ready()) return;
    const draft = await this.drafts.find(job);
    this.form.group.reset(draft?.typed ?? emptyClaim(today));
    this.draft.set(draft);
    this.ready.set(true);
  }

  private async ended(sent: SentClaim): Promise<void> {
    if (sent.kind === 'recorded') {
      await this.keep({ sentAs: sent.claimRef, tried: undefined });
      await this.sendPhotos();
      return;
    }
    this.problem.set(sent.problem);
    if (sent.kind === 'refused') {
      this.form.refused(sent.problem);
      this.lookAtWrong();
    }
  }

  private async keep(change: ClaimDraftChange): Promise<void> {
    const kept = await this.drafts.change(this.place(), change);
    if (kept) this.draft.set(kept);
  }

  private lookAtWrong(): void {
    // The fields show what is wrong with them at the next drawing.
    setTimeout(() => this.fields()?.focusWrong());
  }
}
