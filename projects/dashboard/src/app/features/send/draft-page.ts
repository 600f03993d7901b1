import {
  afterRenderEffect,
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  ElementRef,
  inject,
  input,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { RouterLink } from '@angular/router';
import { firstValueFrom } from 'rxjs';
import { describeProblem } from '../../core/api/problem';
import { Catalogue } from '../../core/catalogue/catalogue';
import { Drafts } from '../../core/drafts/drafts';
import { JobOutbox } from '../../core/drafts/outbox';
import { RouteAnnouncer } from '../../core/shell/route-announcer';
import { windowIs } from '../../ui/narrow';
import { Progress } from '../../ui/progress/progress';
import { Trouble } from '../../ui/trouble/trouble';
import { DraftCheck } from './draft-check';
import { OpenDraft } from './open-draft';
import { DraftAside } from './pieces/draft-aside';
import { KeptLine } from './pieces/kept-line';
import { StepList } from './pieces/step-list';
import { ThrowAwayDialog, type ThrownAway } from './pieces/throw-away-dialog';
import { carWords } from './review-words';
import { SendClock } from './send-clock';
import { FILLED_STEPS, NEXT_WORDS, SEND_STEPS, stepOf, stepWords } from './send-steps';
import { StepWay } from './step-way';
import { BillStep } from './steps/bill-step';
import { CarStep } from './steps/car-step';
import { FindingsStep } from './steps/findings-step';
import { PackageStep } from './steps/package-step';
import { ProductStep } from './steps/product-step';
import { ReviewStep } from './steps/review-step';
import { StagesStep } from './steps/stages-step';

/** One job being written, step by step: a form for a phone in a workshop, without the rest of the product around it. */
@Component({
  selector: 'us-draft-page',
  imports: [
    BillStep,
    CarStep,
    DraftAside,
    FindingsStep,
    KeptLine,
    MatButton,
    PackageStep,
    ProductStep,
    Progress,
    ReviewStep,
    RouteAnnouncer,
    RouterLink,
    StagesStep,
    StepList,
    Trouble,
  ],
  providers: [DraftCheck, OpenDraft, SendClock, StepWay],
  templateUrl: './draft-page.html',
  styleUrl: './draft-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DraftPage {
  // From the address.
  readonly draft = input.required<string>();
  readonly step = input<string>();

  protected readonly open = inject(OpenDraft);
  protected readonly way = inject(StepWay);
  private readonly drafts = inject(Drafts);
  private readonly outbox = inject(JobOutbox);
  private readonly catalogue = inject(Catalogue);
  private readonly dialog = inject(MatDialog);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  protected readonly findings = viewChild(FindingsStep);

  protected readonly filled = FILLED_STEPS;
  protected readonly isWide = windowIs('(min-width: 1000px)');
  protected readonly at = computed(() => stepOf(this.step(), this.open.kept()?.step ?? 0));
  protected readonly place = computed(() => SEND_STEPS.indexOf(this.at()));
  protected readonly words = computed(() => stepWords(this.at()));
  protected readonly car = computed(() => carWords(this.open.document()));
  protected readonly title = computed(() =>
    this.open.kept()?.corrects === undefined ? 'Send a job' : 'Correct a job',
  );
  protected readonly back = computed(() => SEND_STEPS[this.place() - 1]);
  protected readonly next = computed(() => SEND_STEPS[this.place() + 1]);
  protected readonly nextWords = computed(() => {
    const next = this.next();
    return next && `Next: ${NEXT_WORDS[next]}`;
  });
  protected readonly backWords = computed(() => {
    const back = this.back();
    return back ? NEXT_WORDS[back] : '';
  });
  protected readonly branchName = computed(() => this.catalogue.branchName(this.open.branch()));
  protected readonly isLocked = computed(() =>
    ['sending', 'sent'].includes(this.open.kept()?.state ?? ''),
  );
  protected readonly busy = signal(false);
  protected readonly trouble = signal<string | undefined>(undefined);
  protected readonly done = signal<string | undefined>(undefined);

  constructor() {
    effect(() => this.open.id.set(this.draft()));
    effect(() => {
      if (this.open.isOpen() && this.at() === 'review') this.open.looked.set(true);
    });
    let shown: string | undefined;
    afterRenderEffect(() => {
      const step = this.at();
      if (!this.open.isOpen()) return;
      const before = shown;
      shown = step;
      if (before !== undefined && before !== step) untracked(() => this.focus());
    });
  }

  protected addAnother(): void {
    this.findings()?.addAnother();
    this.host.querySelector<HTMLElement>('us-underside-pick')?.scrollIntoView();
  }

  /** Hands the job over, or goes to what is missing first. */
  protected async send(): Promise<void> {
    this.open.looked.set(true);
    this.trouble.set(undefined);
    const count = this.open.problems().length;
    if (count > 0) {
      this.trouble.set(
        'Not sent yet: what is still missing stands at the top. Everything is kept.',
      );
      this.host.querySelector<HTMLElement>('us-review-step .problem')?.focus();
      return;
    }
    await this.attempt(async () => {
      await this.outbox.send(this.draft());
      await this.way.leave();
    });
  }

  protected async keepForColleagues(): Promise<void> {
    if (!this.open.document().jobRef?.trim()) {
      this.open.looked.set(true);
      this.way.goToField('/jobRef');
      this.trouble.set('Write the reference first: colleagues find the job by it.');
      return;
    }
    await this.attempt(async () => {
      await this.outbox.keepOnServer(this.draft());
      this.done.set(`Kept at ${this.branchName()}: colleagues can go on with it.`);
    });
  }

  protected async throwAway(): Promise<void> {
    const data = { car: this.car(), photos: this.open.photos().length };
    const asked = this.dialog.open<ThrowAwayDialog, ThrownAway, boolean>(ThrowAwayDialog, { data });
    const sure = await firstValueFrom(asked.afterClosed());
    if (sure !== true) return;
    await this.open.flush();
    await this.drafts.remove(this.draft());
    await this.way.leave();
  }

  private async attempt(act: () => Promise<void>): Promise<void> {
    if (this.busy()) return;
    this.busy.set(true);
    this.trouble.set(undefined);
    this.done.set(undefined);
    try {
      await this.open.flush();
      await act();
    } catch (error) {
      this.trouble.set(describeProblem(error).sentence);
    } finally {
      this.busy.set(false);
    }
  }

  /** A new step begins at its top, or in the field that was asked for. */
  private focus(): void {
    this.trouble.set(undefined);
    const path = this.open.sought();
    this.open.sought.set(undefined);
    const field = path && this.host.querySelector<HTMLElement>(`[data-path="${CSS.escape(path)}"]`);
    (field || this.host.querySelector<HTMLElement>('h1 button'))?.focus();
  }
}
