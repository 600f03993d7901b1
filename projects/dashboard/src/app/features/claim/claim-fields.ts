import {
  ChangeDetectionStrategy,
  Component,
  computed,
  ElementRef,
  inject,
  input,
  signal,
} from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import type { JobSheet } from '#shared/contracts/jobs';
import { CLAIM_DECISIONS, type ClaimDecision, SIDES, ZONES } from '#shared/domain/vocabulary';
import { Catalogue } from '../../core/catalogue/catalogue';
import { Session } from '../../core/session/session';
import { Caution } from '../../ui/caution/caution';
import { claimPlace } from '../../ui/claims/claim-words';
import { DecisionMark } from '../../ui/claims/decision-mark';
import { currencySign } from '../../ui/format';
import { Trouble } from '../../ui/trouble/trouble';
import type { UndersidePlace } from '../../underside-map/underside-input';
import { UndersidePick } from '../../underside-map/underside-pick';
import { claimCautions } from './claim-cautions';
import { CAUSE_ANSWERS, DECISION_ANSWERS } from './claim-choices';
import type { ClaimForm } from './claim-form';
import { ExplainedChoice } from './explained-choice';
import { limitWords } from './limit-words';

/** The fields of a claim: where on the car, why, what was put in, how it is decided. */
@Component({
  selector: 'us-claim-fields',
  imports: [
    Caution,
    DecisionMark,
    ExplainedChoice,
    MatFormFieldModule,
    MatInput,
    ReactiveFormsModule,
    Trouble,
    UndersidePick,
  ],
  templateUrl: './claim-fields.html',
  styleUrl: './claim-fields.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ClaimFields {
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly catalogue = inject(Catalogue);
  private readonly role = inject(Session).role;

  readonly form = input.required<ClaimForm>();
  /** Its findings are on the map, and say what to beware of. */
  readonly job = input<JobSheet>();
  /** Why the reference cannot be changed, where it cannot. */
  readonly fixed = input<string>();
  /** The decision on record. */
  readonly standing = input<ClaimDecision>('open');

  protected readonly causes = CAUSE_ANSWERS;
  protected readonly decisions = DECISION_ANSWERS;
  protected readonly view = signal<'picture' | 'list'>('picture');
  protected readonly recorder = computed(() => this.role() === 'recorder');
  protected readonly today = computed(() => this.catalogue.today() ?? '');
  protected readonly sign = computed(() => currencySign(this.catalogue.currency()));
  protected readonly typed = computed(() => this.form().typed());
  protected readonly problems = computed(() => this.form().problems());
  protected readonly findings = computed(() => this.job()?.findings ?? []);
  protected readonly cautions = computed(() => claimCautions(this.typed(), this.findings()));
  protected readonly place = computed((): UndersidePlace | null => {
    const zone = ZONES.find((one) => one === this.typed().zone);
    const side = SIDES.find((one) => one === this.typed().side);
    return zone && side ? { zone, side } : null;
  });
  /** A claim on record may name a zone alone. */
  protected readonly zoneAlone = computed(() => {
    const zone = ZONES.find((one) => one === this.typed().zone);
    return zone && this.typed().side === '' ? claimPlace(zone, null) : undefined;
  });
  protected readonly decided = computed(() => this.typed().decision !== 'open');
  protected readonly limit = computed(() =>
    limitWords(this.typed(), {
      role: this.role(),
      limitCents: this.catalogue.value()?.network.claimLimitCents,
      currency: this.catalogue.currency(),
    }),
  );

  /** Nothing is chosen while the map asks which zone is meant. */
  protected placed(place: UndersidePlace | null): void {
    this.form().set({ zone: place?.zone ?? '', side: place?.side ?? '' });
  }

  protected decide(decision: string): void {
    const known = CLAIM_DECISIONS.find((one) => one === decision) ?? 'open';
    const undated = known !== 'open' && this.typed().decidedOn === '';
    this.form().set({ decision: known, ...(undated && { decidedOn: this.today() }) });
  }

  /** Brings the first field that is wrong into view and gives it the focus. */
  focusWrong(): void {
    this.host.nativeElement
      .querySelector<HTMLElement>('.wrong-place, [aria-invalid="true"]')
      ?.focus();
  }
}
