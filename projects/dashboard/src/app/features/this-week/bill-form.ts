import {
  afterRenderEffect,
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  type ElementRef,
  inject,
  input,
  output,
  viewChild,
} from '@angular/core';
import {
  NonNullableFormBuilder,
  ReactiveFormsModule,
  type ValidatorFn,
  Validators,
} from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import type { JobRow } from '#shared/contracts/job-list';
import { billJob, getJob } from '#shared/contracts/jobs';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { markFields } from '../../core/api/mark-fields';
import { formatExactMoney } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { Trouble } from '../../ui/trouble/trouble';
import { proposeBill } from './bill-proposal';
import { amountToType, parseAmount } from '../../ui/parse-amount';

const required: ValidatorFn = (control) => Validators.required(control);

interface Bill {
  readonly totalCents: number;
  readonly number: string | undefined;
  readonly issuedOn: string;
}

/** Writes the bill of one finished car, in its row. What was typed stays until it is taken. */
@Component({
  selector: 'us-bill-form',
  imports: [LoadState, MatButton, MatFormFieldModule, MatInput, ReactiveFormsModule, Trouble],
  templateUrl: './bill-form.html',
  styleUrl: './bill-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BillForm {
  readonly row = input.required<JobRow>();
  readonly currency = input.required<string>();
  readonly today = input.required<string>();
  /** The car is billed: what to say about it. */
  readonly billed = output<string>();
  readonly leave = output();

  private readonly api = inject(Api);
  private readonly amount = viewChild<ElementRef<HTMLInputElement>>('amount');
  protected readonly job = this.api.read(getJob, () => ({ params: this.params() }));
  protected readonly proposal = computed(() => {
    const job = this.job.value();
    return job && proposeBill(job, this.row().beyondChargedMinutes, this.currency());
  });
  protected readonly form = inject(NonNullableFormBuilder).group({
    totalCents: ['', required],
    number: ['', Validators.maxLength(64)],
    issuedOn: ['', required],
  });
  protected readonly billing = deed((bill: Bill) =>
    this.api.call(billJob, {
      params: this.params(),
      body: bill,
      headers: { 'If-Match': this.job.etag() ?? '*' },
    }),
  );

  constructor() {
    effect(() => {
      const proposal = this.proposal();
      if (!proposal) return;
      const { totalCents, issuedOn } = this.form.controls;
      if (totalCents.pristine && proposal.totalCents !== null) {
        totalCents.setValue(amountToType(proposal.totalCents));
      }
      if (issuedOn.pristine) issuedOn.setValue(this.today());
    });
    // Once the job is there and the form stands on the page; before that it cannot take the focus.
    afterRenderEffect(() => {
      if (this.job.value()) this.amount()?.nativeElement.focus();
    });
  }

  protected async save(): Promise<void> {
    this.form.markAllAsTouched();
    const { totalCents: typed, number, issuedOn } = this.form.getRawValue();
    const totalCents = parseAmount(typed);
    if (totalCents === undefined) {
      this.form.controls.totalCents.setErrors({ server: 'Write the amount as 870 or 870.50.' });
    }
    if (this.form.invalid || totalCents === undefined) return;
    const bill = { totalCents, number: number.trim() || undefined, issuedOn };
    const answer = await this.billing.run(bill);
    if (answer) {
      this.billed.emit(
        `Job ${this.row().jobRef} billed: ${formatExactMoney(totalCents, this.currency())}.`,
      );
    } else {
      markFields(this.form, this.billing.problem());
    }
  }

  /** Someone changed the job meanwhile: fetch it as it is now and keep what was typed. */
  protected loadAgain(): void {
    this.billing.clear();
    this.job.reload();
  }

  private params(): { branch: string; jobRef: string } {
    const { branch, jobRef } = this.row();
    return { branch, jobRef };
  }
}
