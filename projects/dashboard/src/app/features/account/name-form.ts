import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { changeName } from '#shared/contracts/auth';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { markFields } from '../../core/api/mark-fields';
import { Session } from '../../core/session/session';
import { Trouble } from '../../ui/trouble/trouble';

/** Changes the own name. */
@Component({
  selector: 'us-name-form',
  imports: [MatButton, MatFormFieldModule, MatInput, ReactiveFormsModule, Trouble],
  templateUrl: './name-form.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NameForm {
  private readonly api = inject(Api);
  private readonly session = inject(Session);
  protected readonly form = inject(NonNullableFormBuilder).group({
    name: [this.session.person()?.name ?? '', [Validators.required, Validators.maxLength(120)]],
  });
  protected readonly saving = deed((name: string) => this.api.call(changeName, { body: { name } }));
  protected readonly saved = signal(false);

  protected async save(): Promise<void> {
    this.saved.set(false);
    this.form.markAllAsTouched();
    if (this.form.invalid) return;
    const answer = await this.saving.run(this.form.getRawValue().name.trim());
    if (answer) this.session.update(answer.body);
    else markFields(this.form, this.saving.problem());
    this.saved.set(answer !== undefined);
  }
}
