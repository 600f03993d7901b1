import { CdkTextareaAutosize } from '@angular/cdk/text-field';
import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { OpenDraft } from '../open-draft';

/** What else is to be said of the job, in as many lines as it takes. */
@Component({
  selector: 'us-notes-field',
  imports: [CdkTextareaAutosize, MatFormFieldModule, MatInput, ReactiveFormsModule],
  template: `
    <mat-form-field>
      <mat-label>Notes</mat-label>
      <textarea
        #box
        matInput
        cdkTextareaAutosize
        cdkAutosizeMinRows="3"
        maxlength="4000"
        data-path="/notes"
        [formControl]="control"
        (input)="draft.type('/notes', box.value, 'line')"
      ></textarea>
    </mat-form-field>
  `,
  styles: `
    mat-form-field {
      width: 100%;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NotesField {
  protected readonly draft = inject(OpenDraft);
  protected readonly control = new FormControl('', { nonNullable: true });

  constructor() {
    effect(() => {
      const notes = this.draft.document().notes ?? '';
      if (notes !== this.control.value && (notes !== '' || this.control.value.trim() !== '')) {
        this.control.setValue(notes);
      }
    });
  }
}
