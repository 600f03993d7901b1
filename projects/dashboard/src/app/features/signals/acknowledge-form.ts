import {
  ChangeDetectionStrategy,
  Component,
  inject,
  input,
  linkedSignal,
  output,
  signal as writable,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { acknowledgeSignal, type Signal } from '#shared/contracts/signals';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { fieldMessage } from '../../core/api/problem';
import { KeptText } from '../../ui/kept-text';
import { Trouble } from '../../ui/trouble/trouble';
import { keyOfSignal } from './signal-words';

/** Says that a signal was seen and what is done about it. What was typed stays until it is taken, through errors and reloads. */
@Component({
  selector: 'us-acknowledge-form',
  imports: [MatButton, MatFormFieldModule, MatInput, Trouble],
  templateUrl: './acknowledge-form.html',
  styles: `
    :host {
      display: block;
      padding: 8px 0 12px;
    }
    .us-form {
      max-width: 620px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AcknowledgeForm {
  readonly of = input.required<Signal>();
  readonly acknowledged = output<Signal>();
  readonly leave = output();

  private readonly api = inject(Api);
  private readonly kept = inject(KeptText);
  protected readonly note = linkedSignal(
    () => this.kept.read(nameOf(this.of())) ?? this.of().acknowledged?.note ?? '',
  );
  /** Sent without a word: asked for. */
  protected readonly missing = writable(false);
  protected readonly saving = deed(({ of, note }: { of: Signal; note: string }) =>
    this.api.call(acknowledgeSignal, {
      params: { branch: of.branch, id: of.id },
      body: { note },
    }),
  );

  protected type(note: string): void {
    this.note.set(note);
    this.missing.set(false);
    this.kept.keep(nameOf(this.of()), note);
  }

  protected wrong(): string | undefined {
    if (this.missing()) return 'Say in a few words what is done about it.';
    return fieldMessage(this.saving.problem(), '/note');
  }

  protected throwAway(): void {
    this.kept.forget(nameOf(this.of()));
    this.saving.clear();
    this.leave.emit();
  }

  protected async save(): Promise<void> {
    const of = this.of();
    const note = this.note().trim();
    this.missing.set(note === '');
    if (note === '') return;
    const answer = await this.saving.run({ of, note });
    if (!answer) return;
    this.kept.forget(nameOf(of));
    this.acknowledged.emit(answer.body);
  }
}

/** The name under which the words about a signal are kept. */
export function nameOf(of: Pick<Signal, 'branch' | 'id'>): string {
  return `signal.${keyOfSignal(of)}`;
}
