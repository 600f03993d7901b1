import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { ClaimDecision } from '#shared/domain/vocabulary';
import { CLAIM_DECISION_NAMES } from '../words';

/**
 * Where a claim stands, by a shape and a word: a filled square is decided, a hollow ring open, a dashed ring only proposed to head
 * office. What is proposed is never drawn like what is decided.
 */
@Component({
  selector: 'us-decision-mark',
  template: `
    <svg viewBox="0 0 14 14" aria-hidden="true" [class]="state()">
      @switch (state()) {
        @case ('decided') {
          <rect x="2" y="2" width="10" height="10" rx="1.5" />
        }
        @default {
          <circle cx="7" cy="7" r="5" />
        }
      }
    </svg>
    <span>
      <span class="word">{{ word() }}</span>
      @if (proposal(); as words) {
        <span class="waits">{{ words }}</span>
      }
    </span>
  `,
  styles: `
    :host {
      display: inline-flex;
      align-items: baseline;
      gap: 7px;
      font-size: 14px;
      line-height: 20px;
    }
    svg {
      flex: none;
      width: 12px;
      height: 12px;
      fill: none;
      stroke: var(--us-ink);
      stroke-width: 1.5;
    }
    .decided {
      fill: var(--us-ink);
    }
    .proposed {
      stroke-dasharray: 2.6 2.6;
    }
    .word {
      font-weight: 500;
    }
    .waits {
      display: block;
      color: var(--us-quiet);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DecisionMark {
  readonly decision = input.required<ClaimDecision>();
  /** What a branch proposes above its limit; head office decides. */
  readonly proposed = input<ClaimDecision | null>();

  protected readonly state = computed(() => {
    if (this.proposed()) return 'proposed';
    return this.decision() === 'open' ? 'open' : 'decided';
  });
  protected readonly word = computed(() =>
    this.proposed() ? 'waits for head office' : CLAIM_DECISION_NAMES[this.decision()],
  );
  protected readonly proposal = computed(() => {
    const proposed = this.proposed();
    if (!proposed) return undefined;
    const standing =
      this.decision() === 'open' ? '' : `; ${CLAIM_DECISION_NAMES[this.decision()]} until then`;
    return `proposed: ${CLAIM_DECISION_NAMES[proposed]}${standing}`;
  });
}
