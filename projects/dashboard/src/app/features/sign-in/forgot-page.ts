import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { RouterLink } from '@angular/router';
import { requestReset } from '#shared/contracts/auth';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { OuterFrame } from '../../core/shell/outer-frame';
import { Trouble } from '../../ui/trouble/trouble';

/** Asking for a mail with a link to set a new password. The answer is the same whether or not the address is known. */
@Component({
  selector: 'us-forgot-page',
  imports: [
    MatButton,
    MatFormFieldModule,
    MatInput,
    OuterFrame,
    ReactiveFormsModule,
    RouterLink,
    Trouble,
  ],
  templateUrl: './forgot-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ForgotPage {
  private readonly api = inject(Api);
  protected readonly form = inject(NonNullableFormBuilder).group({
    email: ['', [Validators.required, Validators.email]],
  });
  protected readonly asking = deed((email: string) =>
    this.api.call(requestReset, { body: { email } }),
  );
  protected readonly asked = signal(false);

  protected async ask(): Promise<void> {
    this.form.markAllAsTouched();
    if (this.form.invalid) return;
    const answer = await this.asking.run(this.form.getRawValue().email.trim());
    this.asked.set(answer !== undefined);
  }
}
