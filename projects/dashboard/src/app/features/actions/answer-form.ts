import {
  ChangeDetectionStrategy,
  Component,
  inject,
  input,
  linkedSignal,
  output,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { type Action, answerAction } from '#shared/contracts/actions';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { fieldMessage } from '../../core/api/problem';
import { KeptText } from '../../ui/kept-text';
import { Trouble } from '../../ui/trouble/trouble';

/** The site manager's answer to an action. What was typed stays until it is taken. */
@Component({
  selector: 'us-answer-form',
  imports: [MatButton, MatFormFieldModule, MatInput, Trouble],
  template: `
    <form class="us-form" (submit)="$event.preventDefault(); save()">
      <mat-form-field>
        <mat-label>Your answer</mat-label>
        <textarea
          #typed
          matInput
          rows="3"
          name="text"
          maxlength="4000"
          [value]="text()"
          [attr.aria-invalid]="wrong() ? true : null"
          [attr.aria-describedby]="wrong() ? 'us-answer-wrong' : null"
          (input)="type(typed.value)"
        ></textarea>
      </mat-form-field>
      <div role="alert">
        @if (wrong(); as said) {
          <us-trouble id="us-answer-wrong">{{ said }}</us-trouble>
        }
        @if (saving.problem(); as problem) {
          <us-trouble>{{ problem.sentence }} What you wrote is kept here.</us-trouble>
        }
      </div>
      <div class="us-form-foot">
        <button matButton="filled" type="submit" [disabled]="saving.busy()">Answer</button>
        <span class="us-small us-quiet">An answer stays; it cannot be taken back.</span>
      </div>
    </form>
  `,
  styles: `
    :host {
      display: block;
      padding-top: 12px;
    }
    .us-form {
      max-width: 620px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AnswerForm {
  readonly of = input.required<Pick<Action, 'branch' | 'id'>>();
  readonly answered = output<Action>();

  private readonly api = inject(Api);
  private readonly kept = inject(KeptText);
  protected readonly text = linkedSignal(() => this.kept.read(nameOf(this.of())) ?? '');
  protected readonly missing = signal(false);
  protected readonly saving = deed(
    ({ branch, id, text }: { branch: string; id: number; text: string }) =>
      this.api.call(answerAction, { params: { branch, id }, body: { text } }),
  );

  protected type(text: string): void {
    this.text.set(text);
    this.missing.set(false);
    this.kept.keep(nameOf(this.of()), text);
  }

  protected wrong(): string | undefined {
    if (this.missing()) return 'Write an answer first.';
    return fieldMessage(this.saving.problem(), '/text');
  }

  protected async save(): Promise<void> {
    const of = this.of();
    const text = this.text().trim();
    this.missing.set(text === '');
    if (text === '') return;
    const answer = await this.saving.run({ branch: of.branch, id: of.id, text });
    if (!answer) return;
    this.kept.forget(nameOf(of));
    this.text.set('');
    this.answered.emit(answer.body);
  }
}

function nameOf({ branch, id }: Pick<Action, 'branch' | 'id'>): string {
  return `answer.${branch}/${id}`;
}
