import { LiveAnnouncer } from '@angular/cdk/a11y';
import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { type Action, changeAction, getAction } from '#shared/contracts/actions';
import { getSignal } from '#shared/contracts/signals';
import { tellSignal } from '#shared/domain/tell-signal';
import type { ActionState } from '#shared/domain/vocabulary';
import { DotIntervalChart } from '../../charts/dot-interval/dot-interval-chart';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { Catalogue } from '../../core/catalogue/catalogue';
import { Session } from '../../core/session/session';
import { Answer } from '../../ui/answer/answer';
import { formatDate, formatInstant } from '../../ui/format';
import { KeptText } from '../../ui/kept-text';
import { LoadState } from '../../ui/load-state/load-state';
import { MEASURE_NAMES } from '../../ui/measure-words';
import { TableTwin } from '../../ui/table-twin/table-twin';
import { Trouble } from '../../ui/trouble/trouble';
import { ActionForm } from './action-form';
import { agreedWords, standingWords } from './action-words';
import { AnswerForm } from './answer-form';
import { effectPicture } from './effect-picture';
import { tellEffect } from './effect-words';
import { type TypedAction, typedOf } from './typed-action';

type Change = Partial<Omit<TypedAction, 'branch'>> & { readonly state?: ActionState };

const SAID: Readonly<Record<ActionState, string>> = {
  agreed: 'The action is under way again.',
  done: 'The action is marked as done.',
  dropped: 'The action is marked as dropped.',
};

/** One action: what the figure did since it was agreed, what the branch answered, and how it ends. */
@Component({
  selector: 'us-action-page',
  imports: [
    ActionForm,
    Answer,
    AnswerForm,
    DotIntervalChart,
    LoadState,
    MatButton,
    RouterLink,
    TableTwin,
    Trouble,
  ],
  templateUrl: './action-page.html',
  styleUrl: './action-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ActionPage {
  readonly branch = input.required<string>();
  readonly id = input.required<string>();

  private readonly api = inject(Api);
  private readonly catalogue = inject(Catalogue);
  private readonly announcer = inject(LiveAnnouncer);
  private readonly kept = inject(KeptText);
  private readonly role = inject(Session).role;

  protected readonly action = this.api.read(getAction, () => ({
    params: { branch: this.branch(), id: Number(this.id()) },
  }));
  private readonly answers = this.api.read(getSignal, () => {
    const action = this.action.value();
    return action?.signal ? { params: { branch: action.branch, id: action.signal } } : undefined;
  });
  /** The signal that it answers, where it still can be read. */
  protected readonly aboutWords = computed(() => {
    const of = this.answers.value();
    return of && tellSignal(of, this.catalogue.branchName(of.branch));
  });

  protected readonly view = computed(() => {
    const action = this.action.value();
    const today = this.catalogue.today();
    if (!action || !today) return undefined;
    const where = this.catalogue.branchName(action.branch);
    return {
      action,
      where,
      answer: tellEffect(action, action.effect, where, today),
      picture: effectPicture(action.effect),
      stands: standingWords(action),
      agreed: agreedWords(action),
      until: formatDate(action.until),
      measure: MEASURE_NAMES[action.measure],
      places: { branch: action.branch },
      thread: action.answers.map(({ by, at, text }) => ({
        text,
        signed: `${by}, ${formatInstant(at)}`,
      })),
      typed: typedOf(action),
      keepAs: `action.${action.branch}/${action.id}`,
    };
  });
  protected readonly mayAnswer = computed(() => this.role() === 'site_manager');
  protected readonly mayChange = computed(
    () => this.role() === 'regional_lead' || this.role() === 'head_office',
  );
  protected readonly changing = signal(false);
  protected readonly last = signal('');
  protected readonly saving = deed(({ of, change }: { of: Action; change: Change }) =>
    this.api.call(changeAction, { params: { branch: of.branch, id: of.id }, body: change }),
  );

  protected async end(of: Action, state: ActionState): Promise<void> {
    if (await this.saving.run({ of, change: { state } })) this.tell(SAID[state]);
  }

  /** Sends what was changed alone, so that what somebody else changed meanwhile stays. */
  protected async change(of: Action, typed: TypedAction): Promise<void> {
    const change: Change = {
      ...(typed.what === of.what ? {} : { what: typed.what }),
      ...(typed.who === of.who ? {} : { who: typed.who }),
      ...(typed.until === of.until ? {} : { until: typed.until }),
      ...(typed.measure === of.measure ? {} : { measure: typed.measure }),
    };
    if (!(await this.saving.run({ of, change }))) return;
    this.kept.forget(`action.${of.branch}/${of.id}`);
    this.changing.set(false);
    this.tell('The action is changed.');
  }

  protected answered(): void {
    this.tell('Your answer is with the action.');
  }

  protected open(): void {
    this.saving.clear();
    this.changing.set(true);
  }

  private tell(words: string): void {
    this.last.set(words);
    void this.announcer.announce(words);
    this.action.reload();
  }
}
