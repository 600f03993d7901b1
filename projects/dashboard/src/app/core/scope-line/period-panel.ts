import {
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
  linkedSignal,
  output,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { isDate } from '#shared/domain/calendar';
import { periodWords } from './scope-words';
import type { Period } from './scope-url';

const WEEKS = [4, 13, 26, 52, 104];

/** Chooses the dates: so many weeks up to today, two dates, or (where a page allows it) all of them. */
@Component({
  selector: 'us-period-panel',
  imports: [MatButton],
  templateUrl: './period-panel.html',
  styleUrl: './panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PeriodPanel {
  /** `undefined`: all dates. */
  readonly chosen = input<Period>();
  /** The dates of the chosen period, to begin from. */
  readonly from = input<string>();
  readonly to = input<string>();
  /** Words for all of them, where a page offers that: "All dates". */
  readonly all = input<string>();
  readonly show = output<Period | undefined>();

  protected readonly presets = WEEKS.map((weeks) => {
    const period: Period = { kind: 'last', weeks };
    const words = periodWords(period);
    return { period, words: words.charAt(0).toUpperCase() + words.slice(1) };
  });
  protected readonly first = linkedSignal(() => this.from() ?? '');
  protected readonly last = linkedSignal(() => this.to() ?? '');
  protected readonly trouble = computed(() =>
    this.first() && this.last() && this.first() > this.last()
      ? 'The first day must not be after the last.'
      : undefined,
  );
  protected readonly ready = computed(
    () => isDate(this.first()) && isDate(this.last()) && !this.trouble(),
  );

  protected isChosen(period: Period): boolean {
    const chosen = this.chosen();
    return chosen?.kind === 'last' && period.kind === 'last' && chosen.weeks === period.weeks;
  }

  protected showDates(): void {
    if (this.ready()) this.show.emit({ kind: 'dates', from: this.first(), to: this.last() });
  }
}
