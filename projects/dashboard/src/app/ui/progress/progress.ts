import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { Bead } from '../bead/bead';

/** Work under way: the bead lengthens along a seam, with a tick where each step to come begins. Without steps it is a plain share of the whole. */
@Component({
  selector: 'us-progress',
  imports: [Bead],
  template: `
    <div
      role="progressbar"
      aria-valuemin="0"
      [attr.aria-valuemax]="of()"
      [attr.aria-valuenow]="done()"
      [attr.aria-label]="label()"
      [attr.aria-valuetext]="words() || null"
    >
      @if (filled() > 0) {
        <us-bead [style.width.%]="filled()" />
      }
      @for (tick of ticks(); track tick) {
        <span class="tick" [style.left.%]="tick"></span>
      }
    </div>
  `,
  styles: `
    div {
      position: relative;
      height: 10px;
      border-top: 2px solid var(--us-ink);
    }
    .tick {
      position: absolute;
      top: 0;
      width: 2px;
      height: 6px;
      background: var(--us-ink);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Progress {
  /** What is under way: "Reading the file". */
  readonly label = input.required<string>();
  readonly done = input.required<number>();
  readonly of = input.required<number>();
  /** How far, in words, where the numbers do not say it: "4 of 6, findings". */
  readonly words = input('');
  /** `shown`: a tick at each step to come. */
  readonly steps = input<'shown' | 'hidden'>('hidden');

  protected readonly filled = computed(() =>
    this.of() > 0 ? Math.min(100, Math.max(0, (this.done() / this.of()) * 100)) : 0,
  );
  protected readonly ticks = computed(() =>
    this.steps() === 'hidden'
      ? []
      : Array.from({ length: this.of() }, (_, step) => step)
          .filter((step) => step > this.done())
          .map((step) => (step / this.of()) * 100),
  );
}
