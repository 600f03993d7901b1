import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { ClaimRow } from '#shared/contracts/claim-list';
import { Catalogue } from '../../core/catalogue/catalogue';
import { claimLink, claimPlace, countedWords } from '../../ui/claims/claim-words';
import { DecisionMark } from '../../ui/claims/decision-mark';
import { formatAmount, formatShortDate } from '../../ui/format';
import { CLAIM_CAUSE_NAMES } from '../../ui/words';
import { carWords, monthWords } from './claim-columns';

/** The list of claims on a phone: a claim an entry, with ways to it and to its job. */
@Component({
  selector: 'us-claim-list',
  imports: [DecisionMark, RouterLink],
  template: `
    <ul>
      @for (row of rows(); track row.branch + row.claimRef) {
        <li>
          <a class="claim" [routerLink]="link(row)">{{ row.claimRef }}</a>
          <span class="car">
            {{ car(row).name }} <span class="us-quiet">{{ car(row).year }}</span>
          </span>
          <us-decision-mark [decision]="row.decision" [proposed]="row.proposedDecision" />
          <span class="more us-quiet">{{ more(row) }}</span>
          <a class="job" [routerLink]="['/jobs', row.branch, row.jobRef]">Job {{ row.jobRef }}</a>
          @if (row.costCents) {
            <span class="cost us-number">{{ amount(row.costCents) }}</span>
          }
        </li>
      }
    </ul>
  `,
  styleUrl: './claim-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ClaimList {
  private readonly catalogue = inject(Catalogue);
  readonly rows = input.required<readonly ClaimRow[]>();

  protected readonly link = claimLink;
  protected readonly car = carWords;
  protected readonly amount = formatAmount;

  protected more(row: ClaimRow): string {
    return [
      ...(this.catalogue.branches().length > 1 ? [this.catalogue.branchName(row.branch)] : []),
      claimPlace(row.zone, row.side),
      CLAIM_CAUSE_NAMES[row.cause],
      [formatShortDate(row.madeOn), monthWords(row)].filter((words) => words).join(', '),
      countedWords(row),
    ].join(' · ');
  }
}
