import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatChipsModule } from '@angular/material/chips';
import { Router, RouterLink } from '@angular/router';
import { type Action, listActions } from '#shared/contracts/actions';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { Catalogue } from '../../core/catalogue/catalogue';
import { ScopeLine } from '../../core/scope-line/scope-line';
import { ScopeState } from '../../core/scope-line/scope-state';
import { Session } from '../../core/session/session';
import { Answer } from '../../ui/answer/answer';
import { LoadState } from '../../ui/load-state/load-state';
import { Trouble } from '../../ui/trouble/trouble';
import { whereWords } from '../../ui/where-words';
import { actionRow } from './action-rows';
import { actionStateOf, STATE_CHOICES } from './action-words';
import { answerActions } from './actions-answer';

/** Actions fetched at a time. */
const FETCHED = 100;

/** What was agreed with branches: what is under way first, and what of it is late. */
@Component({
  selector: 'us-actions-page',
  imports: [Answer, LoadState, MatButton, MatChipsModule, RouterLink, ScopeLine, Trouble],
  templateUrl: './actions-page.html',
  styleUrl: './actions-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ActionsPage {
  /** What the list is narrowed to, from the URL. */
  readonly state = input<string | readonly string[]>();

  private readonly api = inject(Api);
  private readonly router = inject(Router);
  private readonly scope = inject(ScopeState);
  private readonly catalogue = inject(Catalogue);
  private readonly role = inject(Session).role;

  protected readonly choice = computed(() => actionStateOf(this.state()));
  protected readonly choices = STATE_CHOICES;
  protected readonly mayAgree = computed(() => this.role() !== 'site_manager');
  /** Whose actions; it goes along to the form and to the signals. */
  protected readonly places = computed(() => {
    const { region, branch } = this.scope.filters();
    return { region, branch };
  });
  private readonly query = computed(() => {
    const state = this.choice();
    return { ...this.places(), ...(state && { state: [state] }) };
  });
  protected readonly list = this.api.read(listActions, () => ({
    query: { ...this.query(), limit: FETCHED },
  }));
  private readonly further = linkedSignal<
    unknown,
    { items: readonly Action[]; cursor: string | null | undefined }
  >({
    source: () => [this.query(), this.list.value()],
    computation: () => ({ items: [], cursor: undefined }),
  });
  private readonly cursor = computed(() => {
    const { cursor } = this.further();
    return cursor === undefined ? (this.list.value()?.nextCursor ?? null) : cursor;
  });
  protected readonly more = computed(() => this.cursor() !== null);
  protected readonly fetching = deed((cursor: string) =>
    this.api.call(listActions, { query: { ...this.query(), limit: FETCHED, cursor } }),
  );
  private readonly name = (code: string): string => this.catalogue.branchName(code);
  protected readonly rows = computed(() =>
    [...(this.list.value()?.items ?? []), ...this.further().items].map((one) =>
      actionRow(one, this.name(one.branch)),
    ),
  );
  protected readonly answer = computed(() => {
    const list = this.list.value();
    if (!list) return undefined;
    const { region, branch } = this.places();
    const all = this.catalogue.branches();
    const codes = all
      .filter(
        (one) => (!branch || branch.includes(one.code)) && (!region || region.includes(one.region)),
      )
      .map(({ code }) => code);
    const where = whereWords(codes, all.length, this.role(), this.name);
    return answerActions(list, this.choice(), where, this.mayAgree());
  });

  protected narrow(value: string | undefined): void {
    // A press on the chosen one would choose nothing.
    if (value === undefined) return;
    void this.router.navigate([], {
      queryParams: { state: value || null },
      queryParamsHandling: 'merge',
      scroll: 'manual',
    });
  }

  protected async showMore(): Promise<void> {
    const cursor = this.cursor();
    if (cursor === null) return;
    const answer = await this.fetching.run(cursor);
    if (!answer) return;
    const { items, nextCursor } = answer.body;
    this.further.update((before) => ({ items: [...before.items, ...items], cursor: nextCursor }));
  }
}
