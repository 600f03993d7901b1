import {
  ChangeDetectionStrategy,
  Component,
  computed,
  DOCUMENT,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatChipsModule } from '@angular/material/chips';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import {
  IMPORT_KINDS,
  type ImportKind,
  LARGEST_FILE,
  MOST_ROWS,
  putClaimFile,
  putJobFile,
} from '#shared/contracts/imports';
import { EMPTY_AND_ABSENT } from '#shared/domain/import-field';
import { Api } from '../../core/api/api';
import { fieldMessage } from '../../core/api/problem';
import { sending } from '../../core/api/sending';
import { Catalogue } from '../../core/catalogue/catalogue';
import { formatCount } from '../../ui/format';
import { Progress } from '../../ui/progress/progress';
import { saveFile } from '../../ui/save-file';
import { Trouble } from '../../ui/trouble/trouble';
import { refusalOf } from './file-refusal';
import { KIND_NAMES, sizeWords } from './import-words';
import { startingFile, startingHeadings, usualDelimiter } from './starting-file';

/** Whose file it is, what it holds, and the file itself: sent to be looked at, not to be written. */
@Component({
  selector: 'us-send-file',
  imports: [MatButton, MatChipsModule, MatFormFieldModule, MatInput, Progress, Trouble],
  templateUrl: './send-file.html',
  styleUrl: './send-file.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SendFile {
  private readonly api = inject(Api);
  private readonly catalogue = inject(Catalogue);
  private readonly document = inject(DOCUMENT);

  readonly branch = input<string>();
  readonly branches = input.required<readonly { readonly code: string; readonly name: string }[]>();
  readonly choose = output<string>();
  /** Id of the file once the server has it. */
  readonly sent = output<string>();

  protected readonly kinds = IMPORT_KINDS.map((kind) => ({ kind, name: KIND_NAMES[kind] }));
  protected readonly limits = `At most ${LARGEST_FILE / 1024 / 1024}\u202fMB or ${formatCount(MOST_ROWS)} rows.`;
  protected readonly emptyAndAbsent = EMPTY_AND_ABSENT;
  protected readonly kind = signal<ImportKind>('jobs');
  protected readonly file = signal<File | undefined>(undefined);
  protected readonly over = signal(false);
  /** What stands in the way of sending, once it was tried. */
  protected readonly trouble = signal<string | undefined>(undefined);

  protected readonly upload = sending((asked: { branch: string; file: File }) => {
    const body = new FormData();
    body.set('file', asked.file);
    const params = { branch: asked.branch };
    return this.api.upload(this.kind() === 'jobs' ? putJobFile : putClaimFile, { params, body });
  });
  protected readonly goneWords = computed(() => {
    const gone = this.upload.gone();
    if (!gone?.of) return 'Being sent';
    if (gone.bytes >= gone.of) return 'Sent; being looked at';
    return `${sizeWords(gone.bytes)} of ${sizeWords(gone.of)} sent`;
  });
  /** What the server says of the file itself. */
  protected readonly refused = computed(() => {
    const message = fieldMessage(this.upload.problem(), '/file');
    return message && `${message.charAt(0).toUpperCase()}${message.slice(1)}.`;
  });
  protected readonly sizeWords = sizeWords;

  protected take(files: FileList | null): void {
    const file = files?.[0];
    this.over.set(false);
    if (!file || this.upload.gone()) return;
    this.upload.clear();
    const refusal = refusalOf(file);
    this.trouble.set(refusal && `“${file.name}” was not sent. ${refusal}`);
    this.file.set(refusal === undefined ? file : undefined);
  }

  protected drop(event: DragEvent): void {
    event.preventDefault();
    this.take(event.dataTransfer?.files ?? null);
  }

  protected hover(event: DragEvent): void {
    event.preventDefault();
    this.over.set(true);
  }

  protected async send(): Promise<void> {
    const branch = this.branch();
    const file = this.file();
    if (!branch) {
      this.trouble.set('Choose the branch first.');
      return;
    }
    if (!file) {
      this.trouble.set('Choose a file first.');
      return;
    }
    this.trouble.set(undefined);
    const answer = await this.upload.run({ branch, file });
    if (answer) this.sent.emit(answer.body.id);
  }

  protected saveHeadings(): void {
    const catalogue = this.catalogue.value() ?? { products: [], packages: [] };
    const headings = startingHeadings(this.kind(), catalogue);
    const language = this.document.defaultView?.navigator.language ?? 'en';
    const text = startingFile(headings, usualDelimiter(language));
    const file = new Blob([text], { type: 'text/csv;charset=utf-8' });
    saveFile(this.document, `underseam-${this.kind()}.csv`, file);
  }
}
