import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { JobRow } from '#shared/contracts/job-list';
import { Catalogue } from '../../core/catalogue/catalogue';
import { formatAmount, formatShare, formatShortDate, formatSignedMinutes } from '../../ui/format';
import { billWords, carWords, jobLink } from './job-columns';

/** The list of jobs on a phone: a car an entry, the whole entry leading to its sheet. */
@Component({
  selector: 'us-job-list',
  imports: [RouterLink],
  template: `
    <ul>
      @for (row of rows(); track row.branch + row.jobRef) {
        <li>
          <a [routerLink]="link(row)">
            <span class="job">{{ row.jobRef }}</span>
            <span class="car">
              {{ car(row).name }} <span class="us-quiet">{{ car(row).year }}</span>
            </span>
            <span class="end us-number">{{ ending(row) }}</span>
            <span class="more us-quiet">{{ more(row) }}</span>
          </a>
        </li>
      }
    </ul>
  `,
  styleUrl: './job-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class JobList {
  private readonly catalogue = inject(Catalogue);
  readonly rows = input.required<readonly JobRow[]>();
  readonly money = input.required<'shown' | 'hidden'>();

  protected readonly link = jobLink;
  protected readonly car = carWords;

  /** What the entry ends on: what was kept, or how far over the estimate it ran. */
  protected ending(row: JobRow): string {
    if (this.money() === 'shown' && row.marginCents != null) {
      const share = row.marginShare == null ? '' : `, ${formatShare(row.marginShare)}`;
      return `kept ${formatAmount(row.marginCents)}${share}`;
    }
    return row.overrunMinutes === null ? '' : formatSignedMinutes(row.overrunMinutes);
  }

  protected more(row: JobRow): string {
    return [
      ...(this.catalogue.branches().length > 1 ? [this.catalogue.branchName(row.branch)] : []),
      this.catalogue.packageWord(row.package),
      formatShortDate(row.completedOn),
      ...(row.hasRot ? ['rot found'] : []),
      ...(row.unbilled ? [billWords(row)] : []),
    ].join(' · ');
  }
}
