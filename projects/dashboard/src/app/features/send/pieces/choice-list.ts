import { ChangeDetectionStrategy, Component, computed, effect, inject, input } from '@angular/core';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { Trouble } from '../../../ui/trouble/trouble';
import { aboutField } from '../field-words';
import { OpenDraft } from '../open-draft';

/** A field of the draft that is one of several words, picked from the device's own list. */
@Component({
  selector: 'us-choice-list',
  imports: [MatFormFieldModule, MatInput, ReactiveFormsModule, Trouble],
  template: `
    <mat-form-field>
      <mat-label>{{ label() }}</mat-label>
      <select
        #box
        matNativeControl
        [formControl]="control"
        [attr.data-path]="path()"
        (change)="draft.set(path(), box.value || undefined)"
      >
        <option value="" disabled>Choose</option>
        @for (choice of choices(); track choice.value) {
          <option [value]="choice.value">{{ choice.words }}</option>
        }
      </select>
      <mat-error
        ><us-trouble>{{ problem() }}</us-trouble></mat-error
      >
    </mat-form-field>
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
export class ChoiceList {
  readonly path = input.required<string>();
  readonly label = input.required<string>();
  readonly choices =
    input.required<readonly { readonly value: string; readonly words: string }[]>();

  protected readonly draft = inject(OpenDraft);
  protected readonly control = new FormControl('', { nonNullable: true });
  protected readonly problem = computed(() => {
    const message = this.draft.problemAt(this.path());
    return message === undefined ? undefined : aboutField(this.label(), message);
  });

  constructor() {
    effect(() => {
      const value = (this.draft.valueAt(this.path()) as string | undefined) ?? '';
      // Set anew when the words come in after the value did.
      this.choices();
      this.control.setValue(value);
      const problem = this.problem();
      this.control.setErrors(problem === undefined ? null : { problem });
      if (problem !== undefined) this.control.markAsTouched();
    });
  }
}
