import { LiveAnnouncer } from '@angular/cdk/a11y';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import type { OutOf } from '#shared/contracts/endpoint';
import type { JobRow, listJobs } from '#shared/contracts/job-list';
import { DefinitionLink } from '../../ui/definition-link/definition-link';
import { formatAmount, formatCount, formatDays } from '../../ui/format';
import { BillForm } from './bill-form';
import { beyondWords, spentParts } from './unbilled-series';
import type { WeekWords } from './week-words';

const AT_FIRST = 12;

/** Finished cars without a bill, longest wait first; each can be billed in its row. */
@Component({
  selector: 'us-unbilled-cars',
  imports: [BillForm, DefinitionLink, RouterLink],
  templateUrl: './unbilled-cars.html',
  styleUrl: './unbilled-cars.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UnbilledCars {
  readonly list = input.required<OutOf<typeof listJobs>>();
  /** Last day on which they were finished. */
  readonly until = input.required<string>();
  readonly words = input.required<WeekWords>();
  readonly mayBill = input.required<boolean>();
  /** A car was billed: every figure of the page has changed. */
  readonly billed = output();

  private readonly announcer = inject(LiveAnnouncer);
  /** Key of the row whose bill is being written. */
  protected readonly open = signal<string | null>(null);
  protected readonly rows = computed(() =>
    this.list()
      .items.slice(0, AT_FIRST)
      .map((row) => ({
        row,
        key: `${row.branch} ${row.jobRef}`,
        waiting: formatDays(row.daysWaiting ?? 0),
        long: (row.daysWaiting ?? 0) > 14,
        cost: (row.costCents ?? null) === null ? 'cost missing' : formatAmount(row.costCents!),
        beyond: beyondWords(row, this.words(), this.severalBranches()),
      })),
  );
  protected readonly spent = computed(() => spentParts(this.list(), this.words().currency));
  /** The same cars on Jobs: the list has its dates from the longest wait to the end of the week. */
  protected readonly inJobs = computed(() => ({
    unbilled: true,
    sort: 'waiting',
    from: this.list().items[0]?.completedOn,
    to: this.until(),
  }));
  protected readonly all = computed(() =>
    this.list().jobs === 1 ? 'This one in Jobs' : `All ${formatCount(this.list().jobs)} in Jobs`,
  );
  private readonly severalBranches = computed(
    () => new Set(this.list().items.map(({ branch }) => branch)).size > 1,
  );

  protected carOf({ vehicle }: JobRow): string {
    return `${vehicle.make} ${vehicle.model}`;
  }

  protected done(words: string): void {
    this.open.set(null);
    void this.announcer.announce(`${words} The week is counted anew.`);
    this.billed.emit();
  }
}
