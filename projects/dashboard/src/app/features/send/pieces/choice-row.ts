import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import type { Condition } from '#shared/domain/vocabulary';
import { ConditionSign } from '../../../ui/condition-sign/condition-sign';
import { Trouble } from '../../../ui/trouble/trouble';
import { aboutField } from '../field-words';
import { OpenDraft } from '../open-draft';

/** One of the buttons of a row. */
export interface Choice {
  readonly value: string | boolean;
  readonly words: string;
  /** As it is heard, where that says more. */
  readonly name?: string;
  readonly sign?: Condition;
}

let rows = 0;

/** Joined buttons of which one is chosen: a field of the draft with few answers. Pressing the chosen one again takes the answer back. */
@Component({
  selector: 'us-choice-row',
  imports: [ConditionSign, Trouble],
  templateUrl: './choice-row.html',
  styleUrl: './choice-row.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ChoiceRow {
  readonly path = input.required<string>();
  readonly label = input.required<string>();
  readonly choices = input.required<readonly Choice[]>();
  /** `beside`: the label is heard and the buttons say enough by themselves. */
  readonly heading = input<'shown' | 'heard'>('shown');

  protected readonly draft = inject(OpenDraft);
  protected readonly id = `us-choice-row-${++rows}`;

  protected problem(): string | undefined {
    const message = this.draft.problemAt(this.path());
    return message === undefined ? undefined : aboutField(this.label(), message);
  }

  protected pick(value: string | boolean): void {
    const before = this.draft.valueAt(this.path());
    this.draft.set(this.path(), before === value ? undefined : value);
  }
}
