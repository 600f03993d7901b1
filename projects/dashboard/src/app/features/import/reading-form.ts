import { ChangeDetectionStrategy, Component, computed, input, model, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { ImportedFile, ReadingOptions } from '#shared/contracts/imports';
import type { ImportField } from '#shared/domain/import-field';
import { fieldGroups } from './field-groups';
import { chooseField, matchWords, type ReadingDraft } from './reading-draft';
import { READING_CHOICES } from './reading-choices';

/** How the file is read and which column fills which field, open to correction; what is changed counts once it is checked again. */
@Component({
  selector: 'us-reading-form',
  imports: [MatButton],
  templateUrl: './reading-form.html',
  styleUrl: './reading-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReadingForm {
  readonly file = input.required<ImportedFile>();
  readonly fields = input.required<readonly ImportField[]>();
  readonly draft = model.required<ReadingDraft>();
  readonly changed = input.required<boolean>();
  readonly busy = input.required<boolean>();
  readonly check = output();

  protected readonly choices = READING_CHOICES;
  protected readonly groups = computed(() => fieldGroups(this.file().kind, this.fields()));
  protected readonly columns = computed(() => {
    const chosen = new Map(this.draft().columns.map(({ index, field }) => [index, field]));
    return this.file().columns.map((column) => {
      const field = chosen.get(column.index) ?? null;
      return {
        index: column.index,
        heading: column.heading || `Column ${column.index + 1}, without a heading`,
        examples: [...new Set(column.examples)].join(' · '),
        field,
        hint: this.fields().find((one) => one.field === field)?.hint,
        match: matchWords(column, field),
      };
    });
  });

  protected read(name: keyof ReadingOptions, value: string): void {
    const options = { ...this.draft().options, [name]: value };
    this.draft.set({ ...this.draft(), options });
  }

  protected fill(index: number, value: string): void {
    this.draft.set(chooseField(this.draft(), index, value || null, this.fields()));
  }
}
