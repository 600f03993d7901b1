import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { Router, RouterLink } from '@angular/router';
import { deed } from '../../core/api/deed';
import { Session } from '../../core/session/session';
import { OuterFrame } from '../../core/shell/outer-frame';
import { Trouble } from '../../ui/trouble/trouble';

/** Signing in with e-mail and password; leads back to the page that asked for it. */
@Component({
  selector: 'us-sign-in-page',
  imports: [
    MatButton,
    MatFormFieldModule,
    MatInput,
    OuterFrame,
    ReactiveFormsModule,
    RouterLink,
    Trouble,
  ],
  templateUrl: './sign-in-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignInPage {
  private readonly session = inject(Session);
  private readonly router = inject(Router);

  /** Address within the product to go on to. */
  readonly next = input<string>();
  /** `password`: a new password has just been set. */
  readonly done = input<string>();

  protected readonly form = inject(NonNullableFormBuilder).group({
    email: ['', Validators.required],
    password: ['', Validators.required],
  });
  protected readonly entering = deed((pair: { email: string; password: string }) =>
    this.session.signIn(pair.email.trim(), pair.password),
  );
  protected readonly sentence = computed(() => {
    const problem = this.entering.problem();
    if (problem?.status === 401) return 'E-mail and password do not belong together. Try again.';
    return problem?.sentence ?? this.session.resumeProblem()?.sentence;
  });

  protected async enter(): Promise<void> {
    this.form.markAllAsTouched();
    if (this.form.invalid) return;
    const person = await this.entering.run(this.form.getRawValue());
    if (person) await this.router.navigateByUrl(this.next() ?? '/');
  }
}
