import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { listWeekNotes, putWeekNote } from '#shared/contracts/weeks';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { ScopeState } from '../../core/scope-line/scope-state';
import { formatInstant, formatWeekNumber } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { Trouble } from '../../ui/trouble/trouble';
import { NoteDrafts } from './note-drafts';
import { datesOfWeek } from './week-dates';
import type { WeekWords } from './week-words';

const MOST = 4000;

/** Notes on a week: read by everyone who sees its branch, written by its manager and head office. */
@Component({
  selector: 'us-week-note',
  imports: [LoadState, MatButton, MatFormFieldModule, MatInput, Trouble],
  templateUrl: './week-note.html',
  styleUrl: './week-note.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WeekNote {
  readonly week = input.required<string>();
  /** Codes of the branches in view; a note belongs to one of them. */
  readonly branches = input.required<readonly string[]>();
  readonly words = input.required<WeekWords>();
  readonly mayWrite = input.required<boolean>();

  private readonly api = inject(Api);
  private readonly drafts = inject(NoteDrafts);
  private readonly scope = inject(ScopeState);
  protected readonly most = MOST;
  protected readonly notes = this.api.read(listWeekNotes, () => ({
    query: {
      ...datesOfWeek(this.week()),
      region: this.scope.filters().region,
      branch: this.scope.filters().branch,
    },
  }));
  protected readonly heading = computed(
    () => `Note on ${formatWeekNumber(this.week()).toLowerCase()}`,
  );
  protected readonly items = computed(() =>
    (this.notes.value()?.items ?? [])
      .filter(({ week }) => week === this.week())
      .map((note) => ({
        ...note,
        signed: [
          ...(this.branches().length > 1 ? [this.words().branchName(note.branch)] : []),
          `${note.by}, ${formatInstant(note.changedAt)}`,
        ].join(' · '),
      })),
  );
  /** The branch that a note would belong to: the only one in view. */
  protected readonly branch = computed(() =>
    this.mayWrite() && this.branches().length === 1 ? this.branches()[0] : undefined,
  );
  /** Text being written; closed when null. An unsaved draft opens by itself. */
  protected readonly text = linkedSignal<string | null>(() => {
    const branch = this.branch();
    return (branch && this.drafts.read(branch, this.week())) ?? null;
  });
  protected readonly saving = deed((note: { branch: string; week: string; text: string }) =>
    this.api.call(putWeekNote, {
      params: { branch: note.branch, week: note.week },
      body: { text: note.text },
    }),
  );

  protected write(): void {
    this.text.set(this.items()[0]?.text ?? '');
  }

  protected type(text: string): void {
    const branch = this.branch();
    this.text.set(text);
    if (branch) this.drafts.keep(branch, this.week(), text);
  }

  protected leave(): void {
    const branch = this.branch();
    if (branch) this.drafts.forget(branch, this.week());
    this.saving.clear();
    this.text.set(null);
  }

  protected async save(): Promise<void> {
    const branch = this.branch();
    const text = this.text();
    if (!branch || text === null) return;
    const week = this.week();
    const answer = await this.saving.run({ branch, week, text: text.trim() });
    if (!answer) return;
    this.drafts.forget(branch, week);
    this.text.set(null);
    this.notes.reload();
  }
}
