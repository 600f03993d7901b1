import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Catalogue } from '../../core/catalogue/catalogue';
import { PeriodPanel } from '../../core/scope-line/period-panel';
import { ScopePart } from '../../core/scope-line/scope-part';
import { datesOf } from '../../core/scope-line/scope-state';
import type { Period } from '../../core/scope-line/scope-url';
import { ACTION_KINDS, actionWords } from './action-words';
import { type AuditFilters, datesWords, doneWords } from './audit-filters';
import { type Choice, ChoicePanel } from './choice-panel';

/** The line of words above the trail that says what it is narrowed to, each part a control. */
@Component({
  selector: 'us-filter-line',
  imports: [ChoicePanel, MatButton, PeriodPanel, ScopePart],
  templateUrl: './filter-line.html',
  styleUrls: ['../../core/scope-line/scope-line.scss', './filter-line.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FilterLine {
  private readonly catalogue = inject(Catalogue);

  readonly filters = input.required<AuditFilters>();
  /** Who and what occurs in the trail. */
  readonly names = input<{
    readonly actors: readonly string[];
    readonly actions: readonly string[];
  }>();
  /** The subject in words. */
  readonly subject = input.required<string>();
  readonly narrow = output<Partial<AuditFilters>>();

  protected readonly actors = computed<readonly Choice[]>(() =>
    (this.names()?.actors ?? []).map((actor) => ({ value: actor, words: actor })),
  );
  protected readonly actions = computed<readonly Choice[]>(() => {
    const found = this.names()?.actions ?? [];
    const kinds = ACTION_KINDS.filter(({ value }) => found.some((one) => one.startsWith(value)));
    return [...kinds, ...found.map((action) => ({ value: action, words: actionWords(action) }))];
  });
  protected readonly branches = computed<readonly Choice[]>(() =>
    this.catalogue.branches().map(({ code, name }) => ({ value: code, words: name })),
  );
  protected readonly branchWords = computed(() => {
    const code = this.filters().branch;
    return code === undefined ? 'all branches' : this.catalogue.branchName(code);
  });
  protected readonly dates = datesWords;
  protected readonly done = doneWords;
  protected readonly period = computed<Period | undefined>(() => {
    const { from, to } = this.filters();
    return from && to ? { kind: 'dates', from, to } : undefined;
  });

  protected set(part: ScopePart, change: Partial<AuditFilters>): void {
    part.close();
    this.narrow.emit(change);
  }

  protected setPeriod(part: ScopePart, period: Period | undefined): void {
    const dates = period && datesOf(period, this.catalogue.today());
    this.set(part, { from: dates?.from, to: dates?.to });
  }
}
