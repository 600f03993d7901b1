import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import { laidOut } from '../laid-out';
import { HeightTicks } from '../pieces/height-ticks';
import { Picture } from '../pieces/picture';
import { Tooltip } from '../pieces/tooltip';
import type { WeeklyMarginInput } from './weekly-margin-input';
import { layOutWeeklyMargin, type PlacedWeek } from './weekly-margin-layout';

const TOOLTIP_WIDTH = 220;
let charts = 0;

/** Individuals chart of weekly margin: limits, marked weeks, and a list of weeks laid over the picture to read and to choose from. */
@Component({
  selector: 'us-weekly-margin-chart',
  imports: [HeightTicks, Picture, Tooltip],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './weekly-margin-chart.html',
  styleUrl: './weekly-margin-chart.scss',
})
export class WeeklyMarginChart {
  readonly data = input.required<WeeklyMarginInput>();
  /** The ISO week that was picked by pointer or with Enter. */
  readonly choose = output<string>();

  protected readonly id = `us-weekly-margin-${++charts}`;
  protected readonly picture = laidOut(this.data, layOutWeeklyMargin);
  /** Index of the week under pointer or keyboard; none when null. */
  private readonly pointed = signal<number | null>(null);
  protected readonly active = computed(() => {
    const index = this.pointed();
    return index === null ? undefined : this.picture()?.weeks[index];
  });
  protected readonly activeId = computed(() =>
    this.active() ? `${this.id}-${this.active()!.week}` : null,
  );
  protected readonly tooltip = computed(() => {
    const week = this.active();
    const picture = this.picture();
    if (!week || !picture) return undefined;
    const left = Math.max(0, Math.min(week.x - TOOLTIP_WIDTH / 2, picture.width - TOOLTIP_WIDTH));
    const middle = week.y ?? picture.bottom;
    const above = middle > picture.top + 110;
    return { left, top: above ? middle - 16 : middle + 16, above, lines: week.lines };
  });

  protected diamond(week: PlacedWeek): string {
    const y = week.y ?? 0;
    return `M${week.x} ${y - 7}l7 7l-7 7l-7 -7z`;
  }

  protected triangle(week: PlacedWeek): string {
    const y = week.y ?? 0;
    return week.mark === 'run_low'
      ? `M${week.x - 6} ${y - 4.5}h12l-6 10z`
      : `M${week.x - 6} ${y + 4.5}h12l-6 -10z`;
  }

  protected leave(): void {
    this.pointed.set(null);
  }

  /** Takes the week nearest to the pointer. */
  protected follow(event: PointerEvent): void {
    const picture = this.picture();
    if (!picture) return;
    const first = picture.weeks[0]?.x ?? picture.left;
    const nearest = Math.round((event.offsetX + picture.left - first) / picture.pitch);
    this.pointed.set(Math.min(picture.weeks.length - 1, Math.max(0, nearest)));
  }

  protected enter(): void {
    // A tap has pointed at a week already; only the keyboard starts at the chosen one.
    if (this.pointed() !== null) return;
    const weeks = this.data().points;
    const chosen = weeks.findIndex(({ week }) => week === this.data().chosen);
    this.pointed.set(chosen < 0 ? weeks.length - 1 : chosen);
  }

  protected pick(): void {
    const week = this.active();
    if (week) this.choose.emit(week.week);
  }

  protected press(event: KeyboardEvent): void {
    const next = this.afterKey(event.key);
    if (next === undefined) return;
    event.preventDefault();
    this.pointed.set(next);
  }

  private afterKey(key: string): number | null | undefined {
    const last = this.data().points.length - 1;
    const now = this.pointed() ?? last;
    switch (key) {
      case 'ArrowLeft':
      case 'ArrowUp':
        return Math.max(0, now - 1);
      case 'ArrowRight':
      case 'ArrowDown':
        return Math.min(last, now + 1);
      case 'Home':
        return 0;
      case 'End':
        return last;
      case 'Escape':
        return null;
      case 'Enter':
      case ' ':
        this.pick();
        return this.pointed();
      default:
        return undefined;
    }
  }
}
