import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  output,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { type ComeBack, putComeBack } from '#shared/contracts/come-back';
import { isDangerous } from '#shared/domain/danger';
import { COME_BACK_STATUSES, type ComeBackStatus } from '#shared/domain/vocabulary';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { fieldMessage } from '../../core/api/problem';
import { DangerousCount } from '../../core/come-back/dangerous-count';
import { Session } from '../../core/session/session';
import { Caution } from '../caution/caution';
import { Trouble } from '../trouble/trouble';
import { COME_BACK_STATUS_NAMES } from '../words';
import { ComeBackDrafts, type TypedMark } from './come-back-drafts';
import { keyOfFinding, type Markable, TELL_THE_OWNER } from './come-back-words';
import { isChanged, markChange, typedOf } from './mark-change';

/** What a recorder may set (rule 78). */
const OF_RECORDERS: readonly ComeBackStatus[] = ['contacted', 'booked'];

/** Marks one finding that was left on a car. What was typed stays until it is taken, through errors and reloads. */
@Component({
  selector: 'us-come-back-form',
  imports: [Caution, MatButton, MatFormFieldModule, MatInput, Trouble],
  templateUrl: './come-back-form.html',
  styleUrl: './come-back-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ComeBackForm {
  readonly of = input.required<Markable>();
  protected readonly dangerous = computed(() => isDangerous(this.of()));
  /** Today in the branch; no date in the form may lie beyond where that makes no sense. */
  readonly today = input.required<string>();
  readonly marked = output<ComeBack>();
  readonly leave = output();

  private readonly api = inject(Api);
  private readonly drafts = inject(ComeBackDrafts);
  private readonly count = inject(DangerousCount);
  private readonly role = inject(Session).role;

  protected readonly caution = TELL_THE_OWNER;
  protected readonly key = computed(() => keyOfFinding(this.of()));
  protected readonly statuses = computed(() =>
    COME_BACK_STATUSES.filter(
      (status) => this.role() !== 'recorder' || OF_RECORDERS.includes(status),
    ).map((status) => ({ status, name: COME_BACK_STATUS_NAMES[status] })),
  );
  protected readonly typed = linkedSignal<TypedMark>(
    () => this.drafts.read(this.key()) ?? typedOf(this.of()),
  );
  protected readonly changed = computed(() => isChanged(this.of(), this.typed()));
  /** Saved without the date, it is asked for once more. */
  protected readonly asking = signal(false);
  protected readonly chosen = computed(() =>
    this.statuses().some(({ status }) => status === this.typed().status),
  );
  protected readonly saving = deed((mark: { finding: Markable; typed: TypedMark }) =>
    this.api.call(putComeBack, {
      params: paramsOf(mark.finding),
      body: markChange(mark.finding, mark.typed),
    }),
  );

  protected change(part: Partial<TypedMark>): void {
    const typed = { ...this.typed(), ...part };
    this.typed.set(typed);
    this.asking.set(false);
    if (this.changed()) this.drafts.keep(this.key(), typed);
    else this.drafts.forget(this.key());
  }

  protected message(name: keyof TypedMark): string | undefined {
    return fieldMessage(this.saving.problem(), `/${name}`);
  }

  protected ask(): void {
    if (!this.chosen()) return;
    if (this.dangerous() && !this.typed().ownerToldOn && !this.asking()) {
      this.asking.set(true);
      return;
    }
    void this.save();
  }

  protected throwAway(): void {
    this.drafts.forget(this.key());
    this.saving.clear();
    this.asking.set(false);
    this.typed.set(typedOf(this.of()));
    this.leave.emit();
  }

  private async save(): Promise<void> {
    const key = this.key();
    const answer = await this.saving.run({ finding: this.of(), typed: this.typed() });
    if (!answer) return;
    this.drafts.forget(key);
    this.asking.set(false);
    this.count.reload();
    this.marked.emit(answer.body);
  }
}

function paramsOf({ branch, jobRef, ref }: Markable) {
  return { branch, jobRef, ref };
}
