import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { type PlannedChange, tellEffect } from '#shared/contracts/set-up-help';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { Trouble } from '../trouble/trouble';
import { effectSentences } from './effect-words';

/** Says which cars and figures a change would move, before it is made. */
@Component({
  selector: 'us-effect',
  imports: [Trouble],
  template: `
    @if (change()) {
      @if (told.problem(); as problem) {
        @if (problem.status !== 422 && problem.status !== 404) {
          <us-trouble>What it moves could not be counted. {{ problem.sentence }}</us-trouble>
        }
      } @else if (sentences(); as said) {
        <h3>Before you save</h3>
        <p>{{ said.join(' ') }}</p>
        <ng-content />
      } @else {
        <p class="us-quiet">Counting the cars this moves…</p>
      }
    }
  `,
  styles: `
    :host {
      display: block;
      font-size: 14px;
      line-height: 20px;
    }
    :host:has(h3) {
      padding: 8px 14px;
      border-inline-start: 3px solid var(--us-tide);
      background: var(--us-paper);
    }
    h3 {
      font-size: 14px;
      line-height: 20px;
    }
  `,
  host: { 'aria-live': 'polite' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EffectTold {
  /** The change as typed; nothing while it is none yet. */
  readonly change = input<PlannedChange>();

  private readonly catalogue = inject(Catalogue);
  protected readonly told = inject(Api).read(tellEffect, () => {
    const change = this.change();
    return change && { body: { change } };
  });
  protected readonly sentences = computed(() => {
    const change = this.change();
    const effect = this.told.value();
    if (!change || !effect || this.told.refreshing()) return undefined;
    return effectSentences(effect, change, this.catalogue.currency());
  });
  /** Whether all that can be said of the present change stands there, so that it may be saved. */
  readonly said = computed(
    () => !this.change() || this.sentences() !== undefined || this.told.problem() !== undefined,
  );
}
