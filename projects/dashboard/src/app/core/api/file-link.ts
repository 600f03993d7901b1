import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  DOCUMENT,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import type { Subscription } from 'rxjs';
import type { Endpoint } from '#shared/contracts/endpoint';
import { formatNumber } from '../../ui/format';
import { saveFile } from '../../ui/save-file';
import { Trouble } from '../../ui/trouble/trouble';
import { Api, type RequestOf } from './api';
import { describeProblem } from './problem';

/** Words that fetch a file and hand it to the person under its name. Says how far it is and can be cancelled. */
@Component({
  selector: 'us-file-link',
  imports: [Trouble],
  template: `
    @if (bytes() === undefined) {
      <button type="button" class="us-action us-unprinted" (click)="fetch()">{{ words() }}</button>
    } @else {
      <span class="us-small" role="status">{{ comingWords() }}</span>
      <button type="button" class="us-action" (click)="cancel()">Cancel</button>
    }
    @if (sentence(); as said) {
      <us-trouble role="alert">{{ said }}</us-trouble>
    }
  `,
  styles: `
    :host {
      display: inline-flex;
      flex-wrap: wrap;
      align-items: baseline;
      gap: 4px 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FileLink {
  private readonly api = inject(Api);
  private readonly document = inject(DOCUMENT);
  private running: Subscription | undefined;

  readonly endpoint = input.required<Endpoint>();
  readonly query = input<Readonly<Record<string, unknown>>>({});
  /** What the `:names` of its path are. */
  readonly params = input<Readonly<Record<string, unknown>>>();
  readonly words = input.required<string>();
  /** The name under which the file is saved. */
  readonly name = input.required<string>();
  /** The file that was saved. */
  readonly saved = output<Blob>();

  protected readonly bytes = signal<number | undefined>(undefined);
  protected readonly sentence = signal<string | undefined>(undefined);

  constructor() {
    inject(DestroyRef).onDestroy(() => this.running?.unsubscribe());
  }

  protected comingWords(): string {
    const bytes = this.bytes() ?? 0;
    return bytes === 0 ? 'Being written' : `${formatNumber(bytes / 1e6, 1)} MB so far`;
  }

  protected fetch(): void {
    this.bytes.set(0);
    this.sentence.set(undefined);
    const request = { params: this.params(), query: this.query() } as RequestOf<Endpoint>;
    this.running = this.api.download(this.endpoint(), request).subscribe({
      next: (step) => (step.kind === 'coming' ? this.bytes.set(step.bytes) : this.save(step.file)),
      error: (error: unknown) => {
        this.bytes.set(undefined);
        const problem = describeProblem(error);
        this.sentence.set(
          problem.status === 0 || problem.status === 200
            ? 'The file broke off on the way, so nothing was saved. Try again.'
            : problem.sentence,
        );
      },
      complete: () => this.bytes.set(undefined),
    });
  }

  protected cancel(): void {
    this.running?.unsubscribe();
    this.bytes.set(undefined);
  }

  private save(file: Blob): void {
    saveFile(this.document, this.name(), file);
    this.saved.emit(file);
  }
}
