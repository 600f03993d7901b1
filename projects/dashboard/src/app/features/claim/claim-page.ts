import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  signal,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { listClaims } from '#shared/contracts/claim-list';
import { getClaim } from '#shared/contracts/claims';
import { getJob } from '#shared/contracts/jobs';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { Session } from '../../core/session/session';
import { Answer } from '../../ui/answer/answer';
import { Caution } from '../../ui/caution/caution';
import { uncountedWords } from '../../ui/claims/claim-words';
import { DecisionMark } from '../../ui/claims/decision-mark';
import { FactList } from '../../ui/fact-list/fact-list';
import { LoadState } from '../../ui/load-state/load-state';
import { UndersideOnePlace } from '../../underside-map/underside-place';
import { answerClaim } from './claim-answer';
import { claimCautions } from './claim-cautions';
import { ClaimCorrection } from './claim-correction';
import { claimFacts } from './claim-facts';
import { ClaimHistory } from './claim-history';
import { ClaimPhotosKept } from './claim-photos-kept';
import { CorrectionDrafts } from './correction-drafts';
import { typedOf } from './typed-claim';

/** One claim as recorded: where it stands, whether and why it counts, and who changed what. */
@Component({
  selector: 'us-claim-page',
  imports: [
    Answer,
    Caution,
    ClaimCorrection,
    ClaimHistory,
    ClaimPhotosKept,
    DecisionMark,
    FactList,
    LoadState,
    MatButton,
    RouterLink,
    UndersideOnePlace,
  ],
  templateUrl: './claim-page.html',
  styleUrl: './claim-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ClaimPage {
  private readonly api = inject(Api);
  private readonly catalogue = inject(Catalogue);
  private readonly role = inject(Session).role;
  private readonly drafts = inject(CorrectionDrafts);
  private readonly history = viewChild(ClaimHistory);

  // From the path.
  readonly branch = input.required<string>();
  readonly claimRef = input.required<string>();

  protected readonly claim = this.api.read(getClaim, () => ({
    params: { branch: this.branch(), claimRef: this.claimRef() },
  }));
  private readonly jobRef = computed(() => this.claim.value()?.jobRef);
  protected readonly job = this.api.read(getJob, () => {
    const jobRef = this.jobRef();
    return jobRef === undefined ? undefined : { params: { branch: this.branch(), jobRef } };
  });
  /** The claim among those of its job: whether it counts is the server's to say. */
  private readonly among = this.api.read(listClaims, () => {
    const jobRef = this.jobRef();
    return jobRef === undefined
      ? undefined
      : { query: { branch: [this.branch()], jobRef, limit: 200 } };
  });

  /** What was done here last, or just before on the page that led here. */
  protected readonly said = signal(saidBefore(inject(Router)));
  protected readonly opened = signal(false);
  protected readonly maySend = computed(() => this.role() !== 'regional_lead');
  /** A recorder's correction would take a proposal's days with it: what waits is the manager's. */
  protected readonly mayCorrect = computed(
    () =>
      this.maySend() &&
      !(this.role() === 'recorder' && this.claim.value()?.proposedDecision !== undefined),
  );
  protected readonly begun = computed(
    () => this.drafts.read(`${this.branch()}/${this.claimRef()}`) !== undefined,
  );
  protected readonly act = computed(() => {
    if (this.begun()) return 'Go on with your correction';
    const claim = this.claim.value();
    const undecided = claim?.decision === 'open' || claim?.proposedDecision !== undefined;
    return this.role() !== 'recorder' && undecided
      ? 'Decide or correct this claim'
      : 'Correct this claim';
  });
  protected readonly view = computed(() => {
    const claim = this.claim.value();
    if (!claim) return undefined;
    const row = this.among.value()?.items.find((one) => one.claimRef === claim.claimRef);
    const why = row && uncountedWords(row);
    return {
      claim,
      ...answerClaim(claim, { job: this.job.value(), row }),
      facts: claimFacts(claim, this.catalogue.currency()),
      cautions: claimCautions(
        { ...typedOf(claim), labourMinutes: '' },
        this.job.value()?.findings ?? [],
      ),
      counts: row && (why === undefined ? 'counts' : `does not count: ${why}`),
    };
  });

  protected saved(words: string): void {
    this.opened.set(false);
    this.said.set(words);
    this.claim.reload();
    this.among.reload();
    this.history()?.reload();
  }
}

function saidBefore(router: Router): string {
  const state: unknown = router.currentNavigation()?.extras.state?.['said'];
  return typeof state === 'string' ? state : '';
}
