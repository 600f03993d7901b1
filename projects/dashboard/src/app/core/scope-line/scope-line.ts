import { LiveAnnouncer } from '@angular/cdk/a11y';
import { Clipboard } from '@angular/cdk/clipboard';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  DOCUMENT,
  inject,
  input,
  signal,
} from '@angular/core';
import { BODY_TYPES, type BodyType } from '#shared/domain/vocabulary';
import { formatDate, formatWeek } from '../../ui/format';
import { BODY_TYPE_NAMES, BODY_TYPE_PLURALS } from '../../ui/words';
import { Catalogue } from '../catalogue/catalogue';
import { Session } from '../session/session';
import { AsOfPanel } from './as-of-panel';
import { KindsPanel } from './kinds-panel';
import { PeriodPanel } from './period-panel';
import { PlacesPanel } from './places-panel';
import { ScopePart } from './scope-part';
import { ScopeState } from './scope-state';
import type { ScopeChoice } from './scope-url';
import { completedWords, kindsWords, periodWords, placesWords } from './scope-words';
import { WeekPanel } from './week-panel';

/**
 * How a page takes its time: weeks or dates with a default, one week, any dates with "all" as the default, or any dates of completion
 * as of a day.
 */
export type ScopePeriod = 'weeks' | 'week' | 'any' | 'completed';

const ALL_DATES: Readonly<Partial<Record<ScopePeriod, string>>> = {
  any: 'All dates',
  completed: 'All cars',
};

/**
 * The line of words above a page that says what it is about, each part a control. Its state is the URL. What a page puts between
 * its tags stands with the actions.
 */
@Component({
  selector: 'us-scope-line',
  imports: [AsOfPanel, KindsPanel, PeriodPanel, PlacesPanel, ScopePart, WeekPanel],
  templateUrl: './scope-line.html',
  styleUrl: './scope-line.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ScopeLine {
  protected readonly scope = inject(ScopeState);
  protected readonly catalogue = inject(Catalogue);
  private readonly session = inject(Session);
  private readonly clipboard = inject(Clipboard);
  private readonly announcer = inject(LiveAnnouncer);
  private readonly window = inject(DOCUMENT).defaultView;

  readonly period = input<ScopePeriod>('weeks');
  /** `branches`: whose jobs alone, where dates and kinds mean nothing; `network`: all of it, as of a day. */
  readonly parts = input<'all' | 'branches' | 'network'>('all');
  /** The first day there is a car of, where the page knows it. */
  readonly since = input<string>();

  protected readonly regions = computed(() => {
    const branches = this.catalogue.branches();
    return this.catalogue
      .regions()
      .map((region) => ({
        code: region.code,
        name: region.name,
        branches: branches.filter((branch) => branch.region === region.code),
      }))
      .filter((region) => region.branches.length > 0);
  });
  protected readonly allPlaces = computed(() =>
    this.session.role() === 'head_office' ? 'Whole network' : 'All my branches',
  );
  protected readonly placesWords = computed(() => {
    const scope = this.scope;
    const known = this.catalogue;
    return placesWords(
      {
        regions: scope.regions().map((code) => known.regionName(code)),
        branches: scope.branches().map((code) => known.branchName(code)),
      },
      {
        regions: this.regions().map((region) => region.name),
        branches: known.branches().map((branch) => branch.name),
      },
      this.session.role(),
    );
  });
  protected readonly packagesWords = computed(() =>
    kindsWords(
      this.scope.package().map((code) => this.catalogue.packageWord(code)),
      'packages',
    ),
  );
  protected readonly bodyTypes = BODY_TYPES.map((code) => ({ code, name: BODY_TYPE_NAMES[code] }));
  protected readonly bodyTypesWords = computed(() =>
    kindsWords(
      this.scope.bodyType().map((type) => BODY_TYPE_PLURALS[type]),
      'body types',
    ),
  );
  protected readonly periodWords = computed(() => {
    const chosen = this.scope.choice().period;
    if (this.period() === 'completed') return completedWords(chosen, this.since());
    return this.period() === 'any' && !chosen ? 'all dates' : periodWords(this.scope.period());
  });
  /** Words for all dates, where the page offers them. */
  protected readonly allDates = computed(() => ALL_DATES[this.period()]);
  protected readonly asOfWords = computed(() => {
    const day = this.scope.choice().asOf ?? this.catalogue.today();
    return day ? `as of ${formatDate(day)}` : 'as of today';
  });
  protected readonly weekWords = computed(() => {
    const week = this.scope.week();
    return week ? formatWeek(week) : 'last week';
  });
  protected readonly copied = signal<'no' | 'yes' | 'failed'>('no');

  protected change(part: ScopePart, change: Partial<ScopeChoice>): void {
    part.close();
    void this.scope.change(change);
  }

  protected changeBodyTypes(part: ScopePart, types: readonly string[]): void {
    this.change(part, { bodyTypes: types as readonly BodyType[] });
  }

  protected copyLink(): void {
    const done = this.clipboard.copy(this.window?.location.href ?? '');
    this.copied.set(done ? 'yes' : 'failed');
    void this.announcer.announce(done ? 'Link copied' : 'The link is in the address bar');
    this.window?.setTimeout(() => this.copied.set('no'), 3000);
  }

  protected print(): void {
    this.window?.print();
  }
}
