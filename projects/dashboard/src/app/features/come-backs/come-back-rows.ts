import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import type { ComeBack } from '#shared/contracts/come-back';
import { Catalogue } from '../../core/catalogue/catalogue';
import { ComeBackDrafts } from '../../ui/come-back/come-back-drafts';
import { ComeBackForm } from '../../ui/come-back/come-back-form';
import { ComeBackHistory } from '../../ui/come-back/come-back-history';
import { ConditionSign } from '../../ui/condition-sign/condition-sign';
import { DangerSign } from '../../ui/danger-sign/danger-sign';
import { rowWords } from './row-words';

/** The findings left on cars, the dangerous first; each opens to be marked, or to show the marks set so far. */
@Component({
  selector: 'us-come-back-rows',
  imports: [ComeBackForm, ComeBackHistory, ConditionSign, DangerSign, RouterLink],
  templateUrl: './come-back-rows.html',
  styleUrl: './come-back-rows.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ComeBackRows {
  readonly items = input.required<readonly ComeBack[]>();
  readonly today = input.required<string>();
  /** Whether the reader may set marks; else the marks so far are shown alone. */
  readonly marks = input.required<'set' | 'read'>();
  readonly marked = output<ComeBack>();

  private readonly drafts = inject(ComeBackDrafts);
  private readonly catalogue = inject(Catalogue);
  /** Key of the row that is open. */
  protected readonly open = signal<string | null>(null);
  private readonly several = computed(() => this.catalogue.branches().length > 1);
  protected readonly rows = computed(() =>
    this.items().map((item) =>
      rowWords(
        item,
        this.today(),
        this.several() ? this.catalogue.branchName(item.branch) : undefined,
      ),
    ),
  );

  protected word(key: string): string {
    if (this.open() === key) return 'Close';
    if (this.marks() === 'read') return 'Marks';
    return this.drafts.read(key) ? 'Draft' : 'Mark';
  }

  protected done(item: ComeBack): void {
    this.open.set(null);
    this.marked.emit(item);
  }
}
