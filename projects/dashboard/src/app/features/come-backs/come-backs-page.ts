import { LiveAnnouncer } from '@angular/cdk/a11y';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  signal,
} from '@angular/core';
import { MatChipsModule } from '@angular/material/chips';
import { Router, RouterLink } from '@angular/router';
import { type ComeBack, listComeBack } from '#shared/contracts/come-back';
import { exportComeBack } from '#shared/contracts/exports';
import { WaitDotsChart } from '../../charts/wait-dots/wait-dots-chart';
import { Api } from '../../core/api/api';
import { CsvLink } from '../../core/api/csv-link';
import { deed } from '../../core/api/deed';
import { Catalogue } from '../../core/catalogue/catalogue';
import { keepLive } from '../../core/live/keep-live';
import { ScopeLine } from '../../core/scope-line/scope-line';
import { ScopeState } from '../../core/scope-line/scope-state';
import { Session } from '../../core/session/session';
import { Answer } from '../../ui/answer/answer';
import { keyOfFinding, placeOf } from '../../ui/come-back/come-back-words';
import { DefinitionLink } from '../../ui/definition-link/definition-link';
import { EmptyNext } from '../../ui/empty-next/empty-next';
import { formatCount, formatCounted } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { TableTwin } from '../../ui/table-twin/table-twin';
import { Trouble } from '../../ui/trouble/trouble';
import { COME_BACK_STATUS_NAMES } from '../../ui/words';
import { answerComeBacks } from './come-back-answer';
import { ComeBackRows } from './come-back-rows';
import { STATUS_CHOICES, statusOf } from './status-filter';
import { waitPicture } from './wait-picture';

/** Findings fetched at a time: the most that the list gives. */
const FETCHED = 200;
/** Rows shown at first, and added at a time. */
const SHOWN = 50;

/** Rot that left with cars: the dangerous first, who knows of it, and what was agreed since. */
@Component({
  selector: 'us-come-backs-page',
  imports: [
    Answer,
    ComeBackRows,
    CsvLink,
    DefinitionLink,
    EmptyNext,
    LoadState,
    MatChipsModule,
    RouterLink,
    ScopeLine,
    TableTwin,
    Trouble,
    WaitDotsChart,
  ],
  templateUrl: './come-backs-page.html',
  styleUrl: './come-backs-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ComeBacksPage {
  /** What the list is narrowed to, from the URL. */
  readonly status = input<string | readonly string[]>();

  private readonly api = inject(Api);
  private readonly router = inject(Router);
  private readonly scope = inject(ScopeState);
  private readonly announcer = inject(LiveAnnouncer);
  private readonly catalogue = inject(Catalogue);
  private readonly role = inject(Session).role;

  protected readonly choice = computed(() => statusOf(this.status()));
  protected readonly choices = STATUS_CHOICES;
  /** The list has no default period: without one in the URL it holds all dates. */
  protected readonly query = computed(() => {
    const status = this.choice();
    const dated = this.scope.choice().period !== undefined;
    const scope = dated ? this.scope.query() : this.scope.filters();
    return scope && { ...scope, ...(status ? { status: [status] } : {}) };
  });
  protected readonly list = keepLive(
    this.api.read(listComeBack, () => {
      const query = this.query();
      return query && { query: { ...query, limit: FETCHED } };
    }),
    'jobs',
  );

  /** What "Show more" has fetched beyond the first answer; it belongs to one question. */
  private readonly further = linkedSignal<
    unknown,
    { items: readonly ComeBack[]; cursor: string | null | undefined }
  >({
    source: () => JSON.stringify(this.query()),
    computation: () => ({ items: [], cursor: undefined }),
  });
  private readonly cursor = computed(() => {
    const cursor = this.further().cursor;
    return cursor === undefined ? (this.list.value()?.nextCursor ?? null) : cursor;
  });
  /** A mark moves findings between pages: each is listed once. */
  protected readonly items = computed(() => {
    const byKey = new Map<string, ComeBack>();
    for (const item of [...(this.list.value()?.items ?? []), ...this.further().items]) {
      const key = keyOfFinding(item);
      if (!byKey.has(key)) byKey.set(key, item);
    }
    return [...byKey.values()];
  });
  private readonly most = linkedSignal({
    source: () => JSON.stringify(this.query()),
    computation: () => SHOWN,
  });
  protected readonly shown = computed(() => this.items().slice(0, this.most()));
  protected readonly hidden = computed(
    () => (this.list.value()?.findings ?? 0) - this.shown().length,
  );
  protected readonly more = computed(
    () => this.items().length > this.shown().length || this.cursor() !== null,
  );
  protected readonly fetching = deed((cursor: string) =>
    this.api.call(listComeBack, { query: { ...this.query(), limit: FETCHED, cursor } }),
  );

  protected readonly today = computed(() => this.catalogue.today() ?? '');
  protected readonly view = computed(() => {
    const list = this.list.value();
    const today = this.today();
    if (!list || !today) return undefined;
    return {
      answer: answerComeBacks(list, this.choice(), today),
      picture: waitPicture(this.items(), today, list.findings - this.items().length),
      csv: `CSV of ${list.findings === 1 ? 'this row' : `these ${formatCount(list.findings)} rows`}`,
      any: list.findings > 0,
    };
  });
  protected readonly marks = computed(() => (this.role() === 'regional_lead' ? 'read' : 'set'));
  protected readonly moreWords = computed(
    () =>
      `Show more, ${formatCounted(Math.max(1, this.hidden()), 'further finding', 'further findings')}`,
  );
  /** What was marked last, and where it went when it left the list. */
  protected readonly last = signal<
    { readonly words: string; readonly gone: ComeBack['status'] | undefined } | undefined
  >(undefined);
  protected readonly export = exportComeBack;
  protected readonly statusName = COME_BACK_STATUS_NAMES;

  protected narrow(value: string | undefined): void {
    // A press on the chosen one would choose nothing.
    if (value === undefined) return;
    this.last.set(undefined);
    void this.router.navigate([], {
      queryParams: { status: value || null },
      queryParamsHandling: 'merge',
      scroll: 'manual',
    });
  }

  protected marked(item: ComeBack): void {
    const listed = this.choice()
      ? item.status === this.choice()
      : item.status !== 'done' && item.status !== 'gone';
    const { make, model } = item.vehicle;
    const words = `${make} ${model}, ${placeOf(item)}: marked “${COME_BACK_STATUS_NAMES[item.status]}”.`;
    this.last.set({ words, gone: listed ? undefined : item.status });
    void this.announcer.announce(words);
    const key = keyOfFinding(item);
    // Rows fetched further down are not asked for again; the first ones are.
    this.further.update(({ items, cursor }) => ({
      cursor,
      items: items.flatMap((one) => (keyOfFinding(one) === key ? (listed ? [item] : []) : [one])),
    }));
    this.list.reload();
  }

  protected async showMore(): Promise<void> {
    const cursor = this.cursor();
    const wanted = this.most() + SHOWN;
    if (wanted > this.items().length && cursor !== null) {
      const answer = await this.fetching.run(cursor);
      if (!answer) return;
      this.further.update(({ items }) => ({
        items: [...items, ...answer.body.items],
        cursor: answer.body.nextCursor,
      }));
    }
    this.most.set(wanted);
  }
}
