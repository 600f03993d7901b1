import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import {
  cancelImport,
  changeImport,
  confirmImport,
  getImport,
  getRefusedRows,
} from '#shared/contracts/imports';
import { importFields } from '#shared/domain/import-fields';
import { Api } from '../../core/api/api';
import { CsvLink } from '../../core/api/csv-link';
import { deed } from '../../core/api/deed';
import { Catalogue } from '../../core/catalogue/catalogue';
import { Answer } from '../../ui/answer/answer';
import { formatCount, formatInstant } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { Trouble } from '../../ui/trouble/trouble';
import { FilePreview } from './file-preview';
import { FileProgress } from './file-progress';
import { answerImport } from './import-answer';
import { countOf, hasBegun, isUnderWay, sizeWords, toWrite, writtenOf } from './import-words';
import { draftOf, isChanged, type ReadingDraft } from './reading-draft';
import { ReadingForm } from './reading-form';

/** How often work under way is asked after, in milliseconds. */
const EVERY = 700;

/** One file where it stands: being checked, to be looked at and confirmed, being written, or ended. */
@Component({
  selector: 'us-file-standing',
  imports: [
    Answer,
    CsvLink,
    FilePreview,
    FileProgress,
    LoadState,
    MatButton,
    ReadingForm,
    RouterLink,
    Trouble,
  ],
  templateUrl: './file-standing.html',
  styleUrl: './file-standing.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FileStanding {
  private readonly api = inject(Api);
  private readonly catalogue = inject(Catalogue);

  readonly branch = input.required<string>();
  readonly id = input.required<string>();

  protected readonly params = computed(() => ({ branch: this.branch(), id: this.id() }));
  protected readonly reading = this.api.follow(getImport, () => ({ params: this.params() }), {
    every: EVERY,
    goesOn: isUnderWay,
  });
  protected readonly fields = computed(() => {
    const kind = this.reading.value()?.kind ?? 'jobs';
    return importFields(kind, this.catalogue.value() ?? { products: [], packages: [] });
  });
  protected readonly view = computed(() => {
    const file = this.reading.value();
    return file && { file, answer: answerImport(file, (name) => this.labelOf(name)) };
  });

  /** Of what is stored, as text: an equal answer does not throw away what was chosen. */
  private readonly stored = computed(() => {
    const file = this.reading.value();
    return file && JSON.stringify(draftOf(file));
  });
  protected readonly draft = linkedSignal<string | undefined, ReadingDraft | undefined>({
    source: this.stored,
    computation: (text) => (text === undefined ? undefined : (JSON.parse(text) as ReadingDraft)),
  });
  protected readonly changed = computed(() => {
    const file = this.reading.value();
    const draft = this.draft();
    return file !== undefined && draft !== undefined && isChanged(draft, file);
  });

  protected readonly checking = deed((draft: ReadingDraft) =>
    this.api.call(changeImport, {
      params: this.params(),
      body: { options: draft.options, columns: [...draft.columns] },
    }),
  );
  protected readonly confirming = deed(() =>
    this.api.call(confirmImport, { params: this.params() }),
  );
  protected readonly stopping = deed(() => this.api.call(cancelImport, { params: this.params() }));
  protected readonly busy = computed(
    () =>
      this.checking.busy() ||
      this.confirming.busy() ||
      this.stopping.busy() ||
      this.reading.refreshing(),
  );
  protected readonly problem = computed(
    () => this.checking.problem() ?? this.confirming.problem() ?? this.stopping.problem(),
  );

  protected readonly refusedRows = getRefusedRows;
  protected readonly refusedWords = computed(
    () => `Refused rows as CSV, ${formatCount(this.reading.value()?.counts.refused ?? 0)}`,
  );
  protected readonly writeWords = computed(() => {
    const file = this.reading.value();
    return file ? `Write ${countOf(file.kind, toWrite(file))}` : '';
  });
  /** Who sent it and when. */
  protected readonly about = computed(() => {
    const file = this.reading.value();
    if (!file) return '';
    return `“${file.fileName}”, ${sizeWords(file.bytes)}, sent by ${file.by} on ${formatInstant(file.receivedAt)}`;
  });
  protected readonly hasBegun = hasBegun;
  protected readonly toWrite = toWrite;
  protected readonly writtenOf = writtenOf;

  protected async act(done: Promise<unknown>): Promise<void> {
    await done;
    // A refusal too: the file may have moved on meanwhile.
    this.reading.reload();
  }

  protected checkAgain(): Promise<void> {
    const draft = this.draft();
    return draft ? this.act(this.checking.run(draft)) : Promise.resolve();
  }

  private labelOf(name: string): string {
    return this.fields().find((field) => field.field === name)?.label ?? name;
  }
}
