import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import { forkJoin, map, of } from 'rxjs';
import { listVoidedJobs } from '#shared/contracts/corrections';
import { Api } from '../../core/api/api';
import { readingOf } from '../../core/api/reading';
import { Catalogue } from '../../core/catalogue/catalogue';
import { ScopeLine } from '../../core/scope-line/scope-line';
import { ScopeState } from '../../core/scope-line/scope-state';
import { Answer } from '../../ui/answer/answer';
import { formatList } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { VoidedList } from './voided-list';
import { type VoidedJob, voidedSentence } from './voided-words';

/** Jobs shown of one branch: many where it stands alone, the last few where several do. */
const ALONE = 100;
const TOGETHER = 20;

/** Voided jobs, branch by branch, each with the way back. */
@Component({
  selector: 'us-voided-page',
  imports: [Answer, LoadState, RouterLink, ScopeLine, VoidedList],
  templateUrl: './voided-page.html',
  styleUrl: './voided-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VoidedPage {
  private readonly api = inject(Api);
  private readonly scope = inject(ScopeState);
  private readonly catalogue = inject(Catalogue);

  // From the URL.
  readonly cursor = input<string>();

  private readonly codes = computed(() => {
    const { branches, regions } = this.scope.choice();
    const all = this.catalogue.branches();
    const wanted = all.filter(
      ({ code, region }) =>
        (branches.length === 0 && regions.length === 0) ||
        branches.includes(code) ||
        regions.includes(region),
    );
    return wanted.map(({ code }) => code);
  });
  protected readonly alone = computed(() => this.codes().length === 1);
  private readonly question = computed(() => {
    const codes = this.codes();
    const alone = codes.length === 1;
    // No branch yet is an answer too, as soon as it is known.
    return codes.length === 0 && this.catalogue.value() === undefined
      ? undefined
      : { codes, limit: alone ? ALONE : TOGETHER, cursor: alone ? this.cursor() : undefined };
  });
  /** One list a branch: the contract's scope is a branch, and branches have few voided jobs. */
  protected readonly lists = readingOf(
    () => this.question(),
    ({ codes, limit, cursor }) =>
      (codes.length === 0
        ? of([])
        : forkJoin(
            codes.map((branch) =>
              this.api
                .call(listVoidedJobs, {
                  params: { branch },
                  query: { limit, cursor: cursor || undefined },
                })
                .pipe(map(({ body }) => ({ branch, ...body }))),
            ),
          )
      ).pipe(map((body) => ({ body, etag: undefined, status: 200 }))),
  );

  private readonly answered = computed(() => this.lists.value() ?? []);
  protected readonly sections = computed(() =>
    this.answered()
      .filter(({ items }) => items.length > 0)
      .map((list) => ({ ...list, name: this.catalogue.branchName(list.branch) })),
  );
  protected readonly none = computed(() => {
    const empty = this.answered().filter(({ items }) => items.length === 0);
    if (empty.length === 0 || this.sections().length === 0) return '';
    return empty.length > 5
      ? `None at the other ${empty.length} branches.`
      : `None at ${formatList(empty.map(({ branch }) => this.catalogue.branchName(branch)))}.`;
  });
  protected readonly sentence = computed(() => {
    const lists = this.answered();
    const jobs = lists.reduce((sum, { items }) => sum + items.length, 0);
    return voidedSentence(
      jobs,
      lists.some(({ nextCursor }) => nextCursor !== null),
    );
  });
  protected readonly back = signal<VoidedJob | undefined>(undefined);

  protected restored(job: VoidedJob): void {
    this.back.set(job);
    this.lists.reload();
  }
}
