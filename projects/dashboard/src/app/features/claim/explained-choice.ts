import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { Trouble } from '../../ui/trouble/trouble';
import type { ExplainedAnswer } from './claim-choices';

let choices = 0;

/** One of a few answers, each with its explanation, for a thumb in a glove. */
@Component({
  selector: 'us-explained-choice',
  imports: [Trouble],
  template: `
    <fieldset
      [class.wrong]="problem()"
      [attr.aria-describedby]="problem() ? id + '-problem' : null"
    >
      <legend>{{ label() }}</legend>
      @for (answer of answers(); track answer.value) {
        <label [class.chosen]="answer.value === value()">
          <input
            type="radio"
            [name]="id"
            [value]="answer.value"
            [checked]="answer.value === value()"
            [attr.aria-invalid]="problem() ? true : null"
            (change)="picked.emit(answer.value)"
          />
          <span class="words">{{ answer.words }}</span>
          <span class="why">{{ answer.explained }}</span>
        </label>
      }
    </fieldset>
    @if (problem(); as words) {
      <us-trouble [id]="id + '-problem'">{{ words }}</us-trouble>
    }
  `,
  styleUrl: './explained-choice.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ExplainedChoice {
  readonly label = input.required<string>();
  readonly answers = input.required<readonly ExplainedAnswer[]>();
  readonly value = input.required<string>();
  readonly problem = input<string>();
  readonly picked = output<string>();

  protected readonly id = `us-explained-choice-${++choices}`;
}
