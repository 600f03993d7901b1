import { ChangeDetectionStrategy, Component, inject, signal, viewChild } from '@angular/core';
import {
  FormGroupDirective,
  NonNullableFormBuilder,
  ReactiveFormsModule,
  Validators,
} from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { changePassword } from '#shared/contracts/auth';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { markFields } from '../../core/api/mark-fields';
import { Trouble } from '../../ui/trouble/trouble';

/** Changes the own password; the present one is asked for. */
@Component({
  selector: 'us-password-form',
  imports: [MatButton, MatFormFieldModule, MatInput, ReactiveFormsModule, Trouble],
  templateUrl: './password-form.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PasswordForm {
  private readonly api = inject(Api);
  private readonly directive = viewChild.required(FormGroupDirective);
  protected readonly form = inject(NonNullableFormBuilder).group({
    currentPassword: ['', Validators.required],
    newPassword: ['', [Validators.required, Validators.minLength(12)]],
  });
  protected readonly changing = deed((body: { currentPassword: string; newPassword: string }) =>
    this.api.call(changePassword, { body }),
  );
  protected readonly changed = signal(false);

  protected async change(): Promise<void> {
    this.changed.set(false);
    this.form.markAllAsTouched();
    if (this.form.invalid) return;
    const answer = await this.changing.run(this.form.getRawValue());
    if (answer) this.directive().resetForm();
    else markFields(this.form, this.changing.problem());
    this.changed.set(answer !== undefined);
  }
}
