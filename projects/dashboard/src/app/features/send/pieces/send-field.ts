import { ChangeDetectionStrategy, Component, computed, effect, inject, input } from '@angular/core';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { Trouble } from '../../../ui/trouble/trouble';
import { messageWords } from '../field-words';
import { OpenDraft } from '../open-draft';
import { TYPED, type TypedKind } from '../typed-values';
import { WarningLines } from './warning-lines';

let fields = 0;

/** One field of the draft to type into, by its path: it shows what stands there, keeps what is typed, and says what is wrong or unusual. */
@Component({
  selector: 'us-send-field',
  imports: [MatFormFieldModule, MatInput, ReactiveFormsModule, Trouble, WarningLines],
  template: `
    <mat-form-field>
      <mat-label>{{ label() }}</mat-label>
      <input
        #box
        matInput
        [formControl]="control"
        [type]="type()"
        [attr.inputmode]="typed().keyboard"
        [attr.maxlength]="most()"
        [attr.list]="offered().length > 0 ? listId : null"
        [attr.data-path]="path()"
        [readonly]="locked()"
        [attr.placeholder]="placeholder() || null"
        autocomplete="off"
        (input)="draft.type(path(), box.value, kind())"
      />
      @if (note()) {
        <mat-hint>{{ note() }}</mat-hint>
      }
      <mat-error
        ><us-trouble>{{ problem() }}</us-trouble></mat-error
      >
    </mat-form-field>
    @if (offered().length > 0) {
      <datalist [id]="listId">
        @for (word of offered(); track word) {
          <option [value]="word"></option>
        }
      </datalist>
    }
    <us-warning-lines [path]="path()" />
  `,
  styles: `
    :host {
      display: block;
      min-width: 0;
    }
    mat-form-field {
      width: 100%;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SendField {
  readonly path = input.required<string>();
  readonly label = input.required<string>();
  readonly kind = input<TypedKind>('line');
  /** Below the field: a unit, a norm, what to write. */
  readonly note = input('');
  readonly placeholder = input('');
  readonly most = input<number | null>(null);
  /** Shown and not to be changed. */
  readonly locked = input(false);
  /** Words to offer while one types. */
  readonly offered = input<readonly string[]>([]);

  protected readonly draft = inject(OpenDraft);
  protected readonly listId = `us-send-field-${++fields}`;
  protected readonly control = new FormControl('', { nonNullable: true });
  protected readonly typed = computed(() => TYPED[this.kind()]);
  protected readonly type = computed(() =>
    this.kind() === 'date' || this.kind() === 'month' ? this.kind() : 'text',
  );
  protected readonly problem = computed(() => {
    const message = this.draft.problemAt(this.path());
    if (message === undefined) return undefined;
    const words = messageWords(message);
    return words.endsWith('.') ? words : `${this.label().split(',')[0]} ${words}.`;
  });

  constructor() {
    effect(() => {
      const value = this.draft.valueAt(this.path()) as string | number | undefined;
      const unread = this.draft.unreadText(this.path());
      const text = this.control.value;
      // What is being typed stays as it is typed as long as it says what is kept.
      const same = unread === undefined && text.trim() !== '' && this.typed().read(text) === value;
      const next = unread ?? (same ? text : value === undefined ? '' : this.typed().show(value));
      if (next !== text) this.control.setValue(next);
      const problem = this.problem();
      this.control.setErrors(problem === undefined ? null : { problem });
      if (problem !== undefined) this.control.markAsTouched();
    });
  }
}
