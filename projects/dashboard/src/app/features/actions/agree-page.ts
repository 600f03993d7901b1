import { LiveAnnouncer } from '@angular/cdk/a11y';
import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { Router } from '@angular/router';
import { agreeAction } from '#shared/contracts/actions';
import { getSignal } from '#shared/contracts/signals';
import { addDays } from '#shared/domain/calendar';
import { tellSignal } from '#shared/domain/tell-signal';
import { BRANCH_MEASURES } from '#shared/domain/vocabulary';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { Catalogue } from '../../core/catalogue/catalogue';
import { KeptText } from '../../ui/kept-text';
import { LoadState } from '../../ui/load-state/load-state';
import { ActionForm } from './action-form';
import type { TypedAction } from './typed-action';

/** How long an action usually is given, days. Common practice, no source. */
const USUAL_DAYS = 28;

/** Agrees an action with a branch, by itself or about a signal. */
@Component({
  selector: 'us-agree-page',
  imports: [ActionForm, LoadState],
  templateUrl: './agree-page.html',
  styles: `
    .us-column {
      padding-top: 24px;
    }
    .about {
      max-width: 720px;
      margin-bottom: 16px;
    }
    .us-sheet {
      max-width: 720px;
      margin-bottom: 24px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AgreePage {
  /** From the URL: the branch, the figure to watch, and the signal that it answers. */
  readonly branch = input<string | readonly string[]>();
  readonly measure = input<string>();
  readonly signal = input<string>();

  private readonly api = inject(Api);
  private readonly router = inject(Router);
  private readonly announcer = inject(LiveAnnouncer);
  private readonly kept = inject(KeptText);
  protected readonly catalogue = inject(Catalogue);

  /** The one branch of the URL, if it names one. */
  private readonly only = computed(() => {
    const branch = this.branch();
    return typeof branch === 'string' ? branch : undefined;
  });
  private readonly answers = computed(() => {
    const id = Number(this.signal());
    const branch = this.only();
    return branch && Number.isInteger(id) && id > 0 ? { branch, id } : undefined;
  });
  protected readonly about = this.api.read(getSignal, () => {
    const params = this.answers();
    return params && { params };
  });
  protected readonly aboutWords = computed(() => {
    const signal = this.about.value();
    return signal && tellSignal(signal, this.catalogue.branchName(signal.branch));
  });
  protected readonly branches = computed(() =>
    this.catalogue
      .branches()
      .filter(({ closedOn }) => closedOn === null)
      .map(({ code, name }) => ({ code, name })),
  );
  protected readonly today = computed(() => this.catalogue.today() ?? '');
  protected readonly at = computed((): TypedAction => {
    const branches = this.branches();
    const only = branches.length === 1 ? branches[0]?.code : undefined;
    return {
      branch: branches.find(({ code }) => code === this.only())?.code ?? only ?? '',
      what: '',
      who: '',
      until: this.today() ? addDays(this.today(), USUAL_DAYS) : '',
      measure: BRANCH_MEASURES.find((one) => one === this.measure()) ?? 'margin',
    };
  });
  /** One draft for each signal, and one for an action that answers none. */
  protected readonly keepAs = computed(() => {
    const answers = this.answers();
    return answers ? `agree.${answers.branch}/${answers.id}` : `agree.${this.only() ?? ''}`;
  });
  protected readonly agreeing = deed(({ branch, ...body }: TypedAction) => {
    const answers = this.answers();
    return this.api.call(agreeAction, {
      params: { branch },
      body: { ...body, ...(answers?.branch === branch && { signal: answers.id }) },
    });
  });

  protected async send(typed: TypedAction): Promise<void> {
    const answer = await this.agreeing.run(typed);
    if (!answer) return;
    this.kept.forget(this.keepAs());
    const { branch, id } = answer.body;
    void this.announcer.announce('The action is agreed.');
    await this.router.navigate(['/actions', branch, id]);
  }

  protected leave(): void {
    void this.router.navigateByUrl(this.answers() ? '/signals' : '/actions');
  }
}
