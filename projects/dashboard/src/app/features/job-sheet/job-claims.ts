import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import { type ClaimRow, listClaims } from '#shared/contracts/claim-list';
import { Api } from '../../core/api/api';
import { ClaimDrafts } from '../../core/drafts/claim-drafts';
import { claimLink, claimPlace, countedWords } from '../../ui/claims/claim-words';
import { DecisionMark } from '../../ui/claims/decision-mark';
import { formatDate } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { CLAIM_CAUSE_NAMES } from '../../ui/words';

/** The claims on a job, the last made first, and the way to record one. */
@Component({
  selector: 'us-job-claims',
  imports: [DecisionMark, LoadState, RouterLink],
  template: `
    <h2>Claims</h2>
    <us-load-state [of]="claims" [empty]="rows().length === 0" shape="rows">
      <p usEmpty class="us-small us-quiet">None on this job.</p>
      <ul>
        @for (row of rows(); track row.claimRef) {
          <li>
            <a [routerLink]="link(row)">{{ row.claimRef }}</a>
            <span class="words">{{ words(row) }}</span>
            <us-decision-mark [decision]="row.decision" [proposed]="row.proposedDecision" />
            <span class="us-quiet">{{ counted(row) }}</span>
          </li>
        }
      </ul>
    </us-load-state>
    @if (records() === 'allowed') {
      <p class="record us-unprinted us-small">
        <a [routerLink]="['/jobs', branch(), jobRef(), 'claim']">{{
          begun() ? 'Go on with the claim begun here' : 'Record a claim'
        }}</a>
      </p>
    }
  `,
  styleUrl: './job-claims.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class JobClaims {
  readonly branch = input.required<string>();
  readonly jobRef = input.required<string>();
  readonly records = input.required<'allowed' | 'refused'>();

  private readonly drafts = inject(ClaimDrafts);
  protected readonly claims = inject(Api).read(listClaims, () => ({
    query: { branch: [this.branch()], jobRef: this.jobRef(), limit: 200 },
  }));
  /** Whether one was begun on this device and not sent. */
  protected readonly begun = signal(false);
  protected readonly rows = computed(() => this.claims.value()?.items ?? []);
  protected readonly link = claimLink;
  protected readonly counted = countedWords;

  constructor() {
    effect(() => {
      const job = { branch: this.branch(), jobRef: this.jobRef() };
      void this.drafts.find(job).then((draft) => this.begun.set(draft !== undefined));
    });
  }

  protected words(row: ClaimRow): string {
    return `${formatDate(row.madeOn)}: ${claimPlace(row.zone, row.side)}, ${CLAIM_CAUSE_NAMES[row.cause]}`;
  }
}
