import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import {
  type AuditEvent,
  checkAudit,
  exportAudit,
  listAudit,
  listAuditNames,
} from '#shared/contracts/audit';
import { listPeople } from '#shared/contracts/people';
import { Api } from '../../core/api/api';
import { CsvLink } from '../../core/api/csv-link';
import { deed } from '../../core/api/deed';
import { Catalogue } from '../../core/catalogue/catalogue';
import { Answer } from '../../ui/answer/answer';
import { LoadState } from '../../ui/load-state/load-state';
import { Trouble } from '../../ui/trouble/trouble';
import { type AuditCheck, auditAnswer } from './audit-answer';
import { type AuditFilters, auditFilters, isNarrowed } from './audit-filters';
import { EventRow } from './event-row';
import { FilterLine } from './filter-line';
import { type Subject, subjectOf } from './subject-words';

/** Events fetched at a time. */
const PAGE = 50;

/** The audit trail: who did what, when and from where, newest first, narrowed by the URL; its chain checked on asking. */
@Component({
  selector: 'us-audit-page',
  imports: [Answer, CsvLink, EventRow, FilterLine, LoadState, MatButton, RouterLink, Trouble],
  templateUrl: './audit-page.html',
  styleUrl: './audit-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AuditPage {
  private readonly api = inject(Api);
  private readonly router = inject(Router);
  private readonly catalogue = inject(Catalogue);

  // From the URL.
  readonly from = input<string>();
  readonly to = input<string>();
  readonly actor = input<string>();
  readonly action = input<string>();
  readonly subject = input<string>();
  readonly branch = input<string>();

  protected readonly filters = computed<AuditFilters>(() =>
    auditFilters({
      from: this.from(),
      to: this.to(),
      actor: this.actor(),
      action: this.action(),
      subject: this.subject(),
      branch: this.branch(),
    }),
  );
  protected readonly asked = computed(() => ({ ...this.filters() }));
  protected readonly narrowed = computed(() => isNarrowed(this.filters()));
  protected readonly names = this.api.read(listAuditNames, () => ({}));
  private readonly people = this.api.read(listPeople, () => ({}));

  protected readonly first = this.api.read(listAudit, () => ({
    query: { ...this.filters(), limit: PAGE },
  }));
  /** What was fetched after the first events; other filters begin anew. */
  private readonly later = linkedSignal<unknown, readonly AuditEvent[]>({
    source: this.first.value,
    computation: () => [],
  });
  protected readonly cursor = linkedSignal(() => this.first.value()?.nextCursor ?? null);
  protected readonly events = computed(() => [
    ...(this.first.value()?.items ?? []),
    ...this.later(),
  ]);
  protected readonly earlier = deed((cursor: string) =>
    this.api.call(listAudit, { query: { ...this.filters(), limit: PAGE, cursor } }),
  );

  protected readonly checking = deed(() => this.api.call(checkAudit, {}));
  private readonly check = signal<AuditCheck | undefined>(undefined);
  protected readonly answer = computed(() => auditAnswer(this.check()));
  protected readonly lastHash = computed(() => this.check()?.lastHash);
  protected readonly export = exportAudit;

  private readonly subjectNames = computed(() => {
    const people = new Map((this.people.value()?.items ?? []).map(({ id, name }) => [id, name]));
    return {
      branchName: (code: string) => this.catalogue.branchName(code),
      regionName: (code: string) => this.catalogue.regionName(code),
      productName: (code: string) => this.catalogue.productName(code),
      packageName: (code: string) => this.catalogue.packageName(code),
      personName: (id: number) => people.get(id),
    };
  });
  protected readonly subjectWords = computed(() => {
    const path = this.filters().subject;
    return path === undefined ? 'anything' : this.subjectOf(path).words;
  });

  protected subjectOf(path: string): Subject {
    return subjectOf(path, this.subjectNames());
  }

  /** Puts a filter into the URL, where the list reads it. */
  protected narrow(change: Partial<AuditFilters>): void {
    const parts: Readonly<Record<string, string | undefined>> = { ...change };
    const queryParams = Object.fromEntries(
      Object.entries(parts).map(([name, value]) => [name, value ?? null]),
    );
    void this.router.navigate([], {
      queryParams,
      queryParamsHandling: 'merge',
      scroll: 'manual',
    });
  }

  protected async showEarlier(cursor: string): Promise<void> {
    const begun = this.first.value();
    const answer = await this.earlier.run(cursor);
    // Other filters were chosen meanwhile: these events belong to the former ones.
    if (!answer || begun !== this.first.value()) return;
    this.later.update((events) => [...events, ...answer.body.items]);
    this.cursor.set(answer.body.nextCursor);
  }

  protected async checkChain(): Promise<void> {
    const answer = await this.checking.run(undefined);
    if (answer) this.check.set(answer.body);
  }
}
