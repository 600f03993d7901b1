import { LiveAnnouncer } from '@angular/cdk/a11y';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  signal as writable,
} from '@angular/core';
import { MatChipsModule } from '@angular/material/chips';
import { Router, RouterLink } from '@angular/router';
import { listSignals, type Signal } from '#shared/contracts/signals';
import { SIGNAL_KINDS } from '#shared/domain/vocabulary';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { Catalogue } from '../../core/catalogue/catalogue';
import { keepLive } from '../../core/live/keep-live';
import { ScopeLine } from '../../core/scope-line/scope-line';
import { ScopeState } from '../../core/scope-line/scope-state';
import { Session } from '../../core/session/session';
import { Answer } from '../../ui/answer/answer';
import { Caution } from '../../ui/caution/caution';
import { TELL_THE_OWNER } from '../../ui/come-back/come-back-words';
import { DefinitionLink } from '../../ui/definition-link/definition-link';
import { formatCounted } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { Trouble } from '../../ui/trouble/trouble';
import { whereWords } from '../../ui/where-words';
import { filtersOf, KIND_NAMES, STATE_CHOICES } from './signal-filters';
import { groupSignals } from './signal-groups';
import { SignalItem } from './signal-item';
import { keyOfSignal, signalRow } from './signal-words';
import { answerSignals } from './signals-answer';

/** Signals fetched at a time: the most that the list gives. */
const FETCHED = 200;

/** What the nightly look found: what can hurt somebody first, then branch by branch. */
@Component({
  selector: 'us-signals-page',
  imports: [
    Answer,
    Caution,
    DefinitionLink,
    LoadState,
    MatChipsModule,
    RouterLink,
    ScopeLine,
    SignalItem,
    Trouble,
  ],
  templateUrl: './signals-page.html',
  styleUrl: './signals-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignalsPage {
  /** What the list is narrowed to, from the URL. */
  readonly state = input<string | readonly string[]>();
  readonly kind = input<string | readonly string[]>();

  private readonly api = inject(Api);
  private readonly router = inject(Router);
  private readonly scope = inject(ScopeState);
  private readonly catalogue = inject(Catalogue);
  private readonly announcer = inject(LiveAnnouncer);
  private readonly role = inject(Session).role;

  protected readonly filters = computed(() => filtersOf(this.state(), this.kind()));
  private readonly query = computed(() => {
    const { state, kind } = this.filters();
    const { region, branch } = this.scope.filters();
    return { region, branch, ...(state && { state: [state] }), ...(kind && { kind: [kind] }) };
  });
  protected readonly list = keepLive(
    this.api.read(listSignals, () => ({ query: { ...this.query(), limit: FETCHED } })),
    'signals',
  );
  /** What "Show more" has fetched beyond the first answer, and signals as they stand since they were acknowledged here. */
  private readonly further = linkedSignal<
    unknown,
    { items: readonly Signal[]; cursor: string | null | undefined }
  >({
    source: () => [this.query(), this.list.value()],
    computation: () => ({ items: [], cursor: undefined }),
  });
  private readonly cursor = computed(() => {
    const { cursor } = this.further();
    return cursor === undefined ? (this.list.value()?.nextCursor ?? null) : cursor;
  });
  protected readonly fetching = deed((cursor: string) =>
    this.api.call(listSignals, { query: { ...this.query(), limit: FETCHED, cursor } }),
  );

  private readonly name = (code: string): string => this.catalogue.branchName(code);
  private readonly items = computed(() => {
    const byKey = new Map<string, Signal>();
    for (const one of [...(this.list.value()?.items ?? []), ...this.further().items]) {
      byKey.set(keyOfSignal(one), one);
    }
    return [...byKey.values()];
  });
  protected readonly groups = computed(() => groupSignals(this.items(), this.name));
  protected readonly answer = computed(() => {
    const list = this.list.value();
    const today = this.catalogue.today();
    if (!list || !today) return undefined;
    return answerSignals(
      { ...list, items: this.items() },
      this.filters(),
      whereWords(this.codes(), this.catalogue.branches().length, this.role(), this.name),
      today,
    );
  });
  private readonly codes = computed(() => {
    const { region, branch } = this.scope.filters();
    return this.catalogue
      .branches()
      .filter(
        (one) => (!branch || branch.includes(one.code)) && (!region || region.includes(one.region)),
      )
      .map(({ code }) => code);
  });

  protected readonly states = STATE_CHOICES;
  protected readonly allKinds = SIGNAL_KINDS.map((value) => ({ value, name: KIND_NAMES[value] }));
  protected readonly more = computed(() => this.cursor() !== null);
  protected readonly mayAgree = computed(() => this.role() !== 'site_manager');
  protected readonly caution = TELL_THE_OWNER;
  /** Where the actions of the same branches are. */
  protected readonly places = computed(() => {
    const { region, branch } = this.scope.filters();
    return { region, branch };
  });
  /** What was noted last, for those who do not see it happen. */
  protected readonly last = writable('');

  protected narrow(name: 'state' | 'kind', value: string | undefined): void {
    // A press on the chosen one would choose nothing.
    if (value === undefined) return;
    this.last.set('');
    void this.router.navigate([], {
      queryParams: { [name]: value || null },
      queryParamsHandling: 'merge',
      scroll: 'manual',
    });
  }

  protected acknowledged(one: Signal): void {
    const { title } = signalRow(one, this.name(one.branch));
    const words = `Noted as seen: ${title}.`;
    this.last.set(words);
    void this.announcer.announce(words);
    this.list.reload();
  }

  protected async showMore(): Promise<void> {
    const cursor = this.cursor();
    if (cursor === null) return;
    const answer = await this.fetching.run(cursor);
    if (!answer) return;
    const { items, nextCursor } = answer.body;
    this.further.update((before) => ({ items: [...before.items, ...items], cursor: nextCursor }));
    void this.announcer.announce(formatCounted(items.length, 'signal added', 'signals added'));
  }
}
