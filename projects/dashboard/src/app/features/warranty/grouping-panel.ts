import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { CurveGroup } from '#shared/contracts/warranty';
import { GROUP_WORDS } from './curves-picture';

/** Chooses what the curves are told apart by. */
@Component({
  selector: 'us-grouping-panel',
  template: `
    <div class="list">
      @for (by of groupings(); track by) {
        <button
          type="button"
          class="choice"
          [attr.aria-pressed]="by === chosen()"
          (click)="show.emit(by)"
        >
          <span class="tick" aria-hidden="true">{{ by === chosen() ? '✓' : '' }}</span>
          {{ words[by] }}
        </button>
      }
    </div>
  `,
  styleUrl: '../../core/scope-line/panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GroupingPanel {
  readonly groupings = input.required<readonly CurveGroup[]>();
  readonly chosen = input.required<CurveGroup>();
  readonly show = output<CurveGroup>();
  protected readonly words = GROUP_WORDS;
}
