import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { addDays, isoWeek, mondayOf } from '#shared/domain/calendar';
import { formatWeek } from '../../ui/format';
import { weekDaysWords } from './scope-words';

/** Weeks added to the list at a time. */
const STEP = 26;

/** Chooses one ISO week, newest first. */
@Component({
  selector: 'us-week-panel',
  imports: [MatButton],
  template: `
    <div class="list">
      @for (item of weeks(); track item.week) {
        <button
          type="button"
          class="choice"
          [attr.aria-pressed]="item.week === chosen()"
          (click)="show.emit(item.week)"
        >
          <span class="tick" aria-hidden="true">{{ item.week === chosen() ? '✓' : '' }}</span>
          {{ item.name }}
          <span class="us-quiet">{{ item.days }}</span>
        </button>
      }
    </div>
    <div class="foot">
      <button matButton="text" type="button" (click)="count.set(count() + step)">
        Earlier weeks
      </button>
    </div>
  `,
  styleUrl: './panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WeekPanel {
  readonly today = input.required<string>();
  readonly chosen = input<string>();
  readonly show = output<string>();
  protected readonly step = STEP;
  protected readonly count = signal(STEP);
  protected readonly weeks = computed(() => {
    const monday = mondayOf(this.today());
    return Array.from({ length: this.count() }, (_, back) => {
      const week = isoWeek(addDays(monday, -7 * back));
      return {
        week,
        name: formatWeek(week),
        days: back === 0 ? 'not over yet' : weekDaysWords(week),
      };
    });
  });
}
