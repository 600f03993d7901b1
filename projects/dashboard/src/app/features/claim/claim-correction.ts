import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  type OnInit,
  output,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { getClaim, putClaim } from '#shared/contracts/claims';
import type { JobSheet } from '#shared/contracts/jobs';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { Session } from '../../core/session/session';
import { CLAIM_DECISION_NAMES } from '../../ui/words';
import { Trouble } from '../../ui/trouble/trouble';
import { differencesOf } from './claim-differences';
import { ClaimFields } from './claim-fields';
import { ClaimForm } from './claim-form';
import { CorrectionDrafts } from './correction-drafts';
import { savedWords } from './saved-words';
import { type ClaimBody, claimBody, type ReadClaim, typedOf } from './typed-claim';

/** Decides or corrects a claim in place. What was typed stays until it is taken; somebody else's change is shown, never written over unseen. */
@Component({
  selector: 'us-claim-correction',
  imports: [ClaimFields, MatButton, Trouble],
  templateUrl: './claim-correction.html',
  styleUrl: './claim-correction.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ClaimCorrection implements OnInit {
  private readonly api = inject(Api);
  private readonly drafts = inject(CorrectionDrafts);
  private readonly role = inject(Session).role;
  private readonly fields = viewChild.required(ClaimFields);

  readonly claim = input.required<ReadClaim>();
  readonly etag = input.required<string>();
  readonly job = input<JobSheet>();
  /** It is on record: what to say of it. */
  readonly saved = output<string>();
  readonly leave = output();

  protected readonly form = new ClaimForm();
  /** The claim that what is typed was last held against. */
  private readonly base = signal<string | undefined>(undefined);
  /** The claim as somebody else left it meanwhile. */
  private readonly theirs = signal<{ claim: ReadClaim; etag: string } | undefined>(undefined);
  protected readonly differences = computed(() => {
    const theirs = this.theirs();
    return theirs && differencesOf(typedOf(theirs.claim), this.form.typed());
  });
  protected readonly standing = computed(() => this.claim().decision);
  protected readonly button = computed(() => {
    const { decision } = this.form.typed();
    const { proposedDecision } = this.claim();
    const decides = decision !== this.standing() || proposedDecision !== undefined;
    if (this.role() === 'recorder' || !decides || decision === 'open') return 'Save the claim';
    return `Save and decide: ${CLAIM_DECISION_NAMES[decision as ReadClaim['decision']]}`;
  });
  protected readonly saving = deed((sent: { body: ClaimBody; etag: string }) =>
    this.api.call(putClaim, {
      params: this.params(),
      body: sent.body,
      headers: { 'If-Match': sent.etag },
    }),
  );
  protected readonly fetching = deed(() => this.api.call(getClaim, { params: this.params() }));

  constructor() {
    effect(() => {
      const typed = this.form.typed();
      const etag = this.base();
      untracked(() => {
        if (etag !== undefined && this.form.group.dirty)
          this.drafts.keep(this.key(), { typed, etag });
      });
    });
  }

  ngOnInit(): void {
    const draft = this.drafts.read(this.key());
    this.form.group.reset(draft?.typed ?? typedOf(this.claim()));
    this.base.set(draft?.etag ?? this.etag());
  }

  protected async save(): Promise<void> {
    const role = this.role();
    const etag = this.base();
    if (!role || etag === undefined) return;
    const read = claimBody(this.form.typed(), this.claim().jobRef, role);
    if ('problems' in read) {
      this.form.mark(read.problems);
      this.lookAtWrong();
      return;
    }
    const answer = await this.saving.run({ body: read.body, etag });
    if (answer) {
      this.drafts.forget(this.key());
      this.saved.emit(savedWords(answer.body));
      return;
    }
    const problem = this.saving.problem();
    if (problem?.status === 412) await this.meet();
    else if (problem) {
      this.form.refused(problem);
      this.lookAtWrong();
    }
  }

  /** What was typed goes over what somebody else left: said by the one who saw both. */
  protected async keepMine(): Promise<void> {
    this.base.set(this.theirs()?.etag);
    this.theirs.set(undefined);
    await this.save();
  }

  protected takeTheirs(): void {
    const theirs = this.theirs();
    if (!theirs) return;
    this.drafts.forget(this.key());
    this.saving.clear();
    this.form.group.reset(typedOf(theirs.claim));
    this.base.set(theirs.etag);
    this.theirs.set(undefined);
  }

  protected throwAway(): void {
    this.drafts.forget(this.key());
    this.leave.emit();
  }

  /** Somebody was first: fetches the claim as it is now, to stand beside what was typed. */
  private async meet(): Promise<void> {
    const answer = await this.fetching.run(undefined);
    if (!answer) return;
    this.theirs.set({ claim: answer.body, etag: answer.etag ?? '*' });
  }

  private params(): { branch: string; claimRef: string } {
    const { branch, claimRef } = this.claim();
    return { branch, claimRef };
  }

  private key(): string {
    const { branch, claimRef } = this.claim();
    return `${branch}/${claimRef}`;
  }

  private lookAtWrong(): void {
    // The fields show what is wrong with them at the next drawing.
    setTimeout(() => this.fields().focusWrong());
  }
}
