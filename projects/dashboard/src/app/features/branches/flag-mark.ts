import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { FunnelFlag } from '#shared/domain/vocabulary';
import { FLAG_WORDS, standOf } from './branch-words';

/** Where a branch stands: the mark of the picture and the words, never colour alone. */
@Component({
  selector: 'us-flag-mark',
  template: `
    <svg width="16" height="16" aria-hidden="true">
      @if (flag() === 'too_few' || !flag()) {
        <path class="few" d="M3 13l10-10M8 14l6-6M2 8l6-6" />
      } @else if (outside()) {
        <path class="outside" d="M8 1.5l6.5 6.5l-6.5 6.5l-6.5-6.5z" />
      } @else {
        <circle class="inside" cx="8" cy="8" r="4.5" />
      }
    </svg>
    <span [class.us-quiet]="!outside()" [class.outside-word]="outside()">{{ words() }}</span>
  `,
  styles: `
    :host {
      display: inline-flex;
      align-items: center;
      gap: 6px;
      white-space: nowrap;
    }
    svg {
      flex: none;
    }
    .inside {
      fill: none;
      stroke: var(--us-ink);
      stroke-width: 1.5;
    }
    .outside {
      fill: var(--us-amber);
      stroke: var(--us-ink);
      stroke-width: 1.25;
    }
    .few {
      stroke: var(--us-zinc);
      stroke-width: 2;
    }
    .outside-word {
      font-weight: 600;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FlagMark {
  /** None where a branch has no cars in this time. */
  readonly flag = input.required<FunnelFlag | undefined>();

  protected readonly outside = computed(() => {
    const flag = this.flag();
    return flag !== undefined && standOf(flag) !== 'inside';
  });
  protected readonly words = computed(() => {
    const flag = this.flag();
    return flag ? FLAG_WORDS[flag] : 'no cars in this time';
  });
}
