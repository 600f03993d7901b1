import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import { laidOut } from '../laid-out';
import { HeightTicks } from '../pieces/height-ticks';
import { Picture } from '../pieces/picture';
import { Tooltip } from '../pieces/tooltip';
import type { FunnelInput } from './funnel-input';
import { layOutFunnel, type PlacedBranch } from './funnel-layout';

const TOOLTIP_WIDTH = 260;
let charts = 0;

/** Branches against their number of cars, each apart from what its own cars lead one to expect, within its own limits. */
@Component({
  selector: 'us-funnel-chart',
  imports: [HeightTicks, Picture, Tooltip],
  templateUrl: './funnel-chart.html',
  styleUrl: './funnel-chart.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FunnelChart {
  readonly data = input.required<FunnelInput>();
  /** The branch that was picked by pointer or with Enter. */
  readonly choose = output<string>();

  protected readonly id = `us-funnel-${++charts}`;
  protected readonly picture = laidOut(this.data, layOutFunnel);
  /** Index of the branch under pointer or keyboard; none when null. */
  private readonly pointed = signal<number | null>(null);
  protected readonly active = computed(() => {
    const index = this.pointed();
    return index === null ? undefined : this.picture()?.branches[index];
  });
  protected readonly activeId = computed(() => {
    const branch = this.active();
    return branch ? `${this.id}-${branch.key}` : null;
  });
  protected readonly tooltip = computed(() => {
    const branch = this.active();
    const picture = this.picture();
    if (!branch || !picture) return undefined;
    const room = picture.width - TOOLTIP_WIDTH;
    const left = Math.max(0, Math.min(branch.x - TOOLTIP_WIDTH / 2, room));
    const above = branch.y > picture.top + 110;
    return { left, top: above ? branch.y - 16 : branch.y + 16, above, lines: branch.lines };
  });

  protected diamond({ x, y }: PlacedBranch): string {
    return `M${x} ${y - 7}l7 7l-7 7l-7 -7z`;
  }

  protected leave(): void {
    this.pointed.set(null);
  }

  /** Takes the branch nearest to the pointer. */
  protected follow(event: PointerEvent): void {
    const picture = this.picture();
    if (!picture) return;
    const far = picture.branches.map(({ x, y }) =>
      Math.hypot(x - picture.left - event.offsetX, y - picture.top - event.offsetY),
    );
    const nearest = far.indexOf(Math.min(...far));
    this.pointed.set(nearest >= 0 && far[nearest]! < 48 ? nearest : null);
  }

  protected enter(): void {
    if (this.pointed() === null && this.data().points.length > 0) this.pointed.set(0);
  }

  protected pick(): void {
    const branch = this.active();
    if (branch) this.choose.emit(branch.key);
  }

  protected press(event: KeyboardEvent): void {
    const next = this.afterKey(event.key);
    if (next === undefined) return;
    event.preventDefault();
    this.pointed.set(next);
  }

  private afterKey(key: string): number | null | undefined {
    const last = this.data().points.length - 1;
    const now = this.pointed() ?? 0;
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
