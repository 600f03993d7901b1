import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { Router, RouterLink } from '@angular/router';
import { setPassword } from '#shared/contracts/auth';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { markFields } from '../../core/api/mark-fields';
import { Session } from '../../core/session/session';
import { OuterFrame } from '../../core/shell/outer-frame';
import { Trouble } from '../../ui/trouble/trouble';

/** Where a mailed link leads: a person invited sets a first password, one who forgot theirs a new one. */
@Component({
  selector: 'us-welcome-page',
  imports: [
    MatButton,
    MatFormFieldModule,
    MatInput,
    OuterFrame,
    ReactiveFormsModule,
    RouterLink,
    Trouble,
  ],
  templateUrl: './welcome-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WelcomePage {
  private readonly api = inject(Api);
  private readonly router = inject(Router);

  protected readonly signedIn = inject(Session).person;
  protected readonly isSet = signal(false);

  /** From the link in the mail; works once. */
  readonly token = input<string>();
  readonly purpose = input<string>();

  protected readonly title = computed(() =>
    this.purpose() === 'reset' ? 'A new password' : 'Welcome to Underseam',
  );
  protected readonly form = inject(NonNullableFormBuilder).group({
    newPassword: ['', [Validators.required, Validators.minLength(12)]],
  });
  protected readonly setting = deed((newPassword: string) =>
    this.api.call(setPassword, { body: { token: this.token() ?? '', newPassword } }),
  );
  protected readonly sentence = computed(() => {
    const problem = this.setting.problem();
    if (!problem || problem.fields.some((field) => field.path === '/newPassword')) return undefined;
    return problem.fields.some((field) => field.path === '/token')
      ? 'This link has been used or is too old. Ask for a new one.'
      : problem.sentence;
  });

  protected async set(): Promise<void> {
    this.form.markAllAsTouched();
    if (this.form.invalid) return;
    const answer = await this.setting.run(this.form.getRawValue().newPassword);
    if (!answer) {
      markFields(this.form, this.setting.problem());
    } else if (this.signedIn()) {
      // Whoever followed somebody's link from the mailbox stays who they are.
      this.isSet.set(true);
    } else {
      await this.router.navigate(['/sign-in'], { queryParams: { done: 'password' } });
    }
  }
}
