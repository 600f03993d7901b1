import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatMenuModule } from '@angular/material/menu';
import { OpenDraft } from '../open-draft';
import { SEND_STEPS, type SendStep, STEP_NAMES, stepWords } from '../send-steps';
import { STATE_WORDS, stepState } from '../step-state';
import { StepWay } from '../step-way';

/** "4 of 6, findings", and from it the way to every other step with how far it is. */
@Component({
  selector: 'us-step-list',
  imports: [MatMenuModule],
  template: `
    <h1>
      <button type="button" class="open" [matMenuTriggerFor]="menu">
        {{ words() }}
        <svg viewBox="0 0 10 6" aria-hidden="true"><path d="M1 1l4 4 4-4" /></svg>
      </button>
    </h1>
    <mat-menu #menu="matMenu">
      @for (one of steps(); track one.step) {
        <button
          mat-menu-item
          type="button"
          [attr.aria-current]="one.step === step() ? 'step' : null"
          (click)="way.go(one.step)"
        >
          <span class="us-menu-check" aria-hidden="true">{{ one.mark }}</span>{{ one.name
          }}<span class="us-unseen">, {{ one.state }}</span>
        </button>
      }
    </mat-menu>
  `,
  styles: `
    h1 {
      font: 600 16px/24px var(--us-font);
    }
    .open {
      display: flex;
      align-items: center;
      gap: 8px;
      min-height: 44px;
      padding: 0;
      border: 0;
      background: none;
      color: var(--us-ink);
      font: 600 16px/24px var(--us-font);
      text-align: start;
      cursor: pointer;
    }
    svg {
      width: 10px;
      height: 6px;
      fill: none;
      stroke: currentColor;
      stroke-width: 1.6;
      stroke-linecap: round;
      stroke-linejoin: round;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StepList {
  readonly step = input.required<SendStep>();
  private readonly draft = inject(OpenDraft);
  protected readonly way = inject(StepWay);
  protected readonly words = computed(() => stepWords(this.step()));
  protected readonly steps = computed(() =>
    SEND_STEPS.map((step) => {
      const state = stepState(this.draft.document(), step);
      const mark = state === 'done' ? '✓' : state === 'begun' ? '…' : '';
      return { step, name: STEP_NAMES[step], mark, state: STATE_WORDS[state] };
    }),
  );
}
