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
import { formatDate } from '../../ui/format';
import { halfYearEnds } from './half-year-ends';

/** Half-years offered by name; any other day by its date. */
const OFFERED = 4;

/** Chooses the day as of which warranty is told: today, the end of a half-year, or any past day. */
@Component({
  selector: 'us-as-of-panel',
  imports: [MatButton],
  template: `
    <div class="list">
      <button
        type="button"
        class="choice"
        [attr.aria-pressed]="!chosen()"
        (click)="show.emit(undefined)"
      >
        <span class="tick" aria-hidden="true">{{ chosen() ? '' : '✓' }}</span> Today
        <span class="us-quiet">{{ formatDate(today()) }}</span>
      </button>
      @for (day of ends(); track day) {
        <button
          type="button"
          class="choice"
          [attr.aria-pressed]="chosen() === day"
          (click)="show.emit(day)"
        >
          <span class="tick" aria-hidden="true">{{ chosen() === day ? '✓' : '' }}</span>
          {{ formatDate(day) }}
          <span class="us-quiet">end of a half-year</span>
        </button>
      }
    </div>
    <form class="dates" (submit)="$event.preventDefault(); showDay()">
      <label class="whole" for="us-as-of">Another day</label>
      <input
        id="us-as-of"
        class="whole"
        type="date"
        [max]="today()"
        [value]="day()"
        (input)="day.set($any($event.target).value)"
      />
      @if (trouble(); as sentence) {
        <p role="alert">{{ sentence }}</p>
      }
      <button matButton="filled" type="submit" [disabled]="!ready()">Show</button>
    </form>
  `,
  styleUrl: './panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AsOfPanel {
  readonly today = input.required<string>();
  /** `undefined`: today. */
  readonly chosen = input<string>();
  readonly show = output<string | undefined>();

  protected readonly formatDate = formatDate;
  protected readonly ends = computed(() => halfYearEnds(this.today(), OFFERED));
  protected readonly day = linkedSignal(() => this.chosen() ?? this.today());
  protected readonly trouble = computed(() =>
    isDate(this.day()) && this.day() > this.today()
      ? 'A day to come cannot be told of: choose today or an earlier one.'
      : undefined,
  );
  protected readonly ready = computed(() => isDate(this.day()) && !this.trouble());

  protected showDay(): void {
    if (this.ready()) this.show.emit(this.day() === this.today() ? undefined : this.day());
  }
}
