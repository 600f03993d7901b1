import {
  ChangeDetectionStrategy,
  Component,
  effect,
  ElementRef,
  inject,
  input,
  output,
  untracked,
} from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { BRANCH_MEASURES, type BranchMeasure } from '#shared/domain/vocabulary';
import { markFields } from '../../core/api/mark-fields';
import type { Problem } from '../../core/api/problem';
import { KeptText } from '../../ui/kept-text';
import { MEASURE_NAMES } from '../../ui/measure-words';
import { Trouble } from '../../ui/trouble/trouble';
import { parseTyped, type TypedAction } from './typed-action';

/** Not only spaces. */
const SAID = Validators.pattern(/\S/);

/** The fields of an action. What is typed is kept under a name until the page says that it was taken. */
@Component({
  selector: 'us-action-form',
  imports: [MatButton, MatFormFieldModule, MatInput, ReactiveFormsModule, Trouble],
  templateUrl: './action-form.html',
  styles: `
    .us-form {
      max-width: 620px;
    }
    .pair {
      display: grid;
      grid-template-columns: repeat(auto-fit, minmax(min(220px, 100%), 1fr));
      gap: 8px 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ActionForm {
  /** What stands in the fields at first. */
  readonly at = input.required<TypedAction>();
  /** Branches to choose from; none where the branch is settled. */
  readonly branches = input<readonly { readonly code: string; readonly name: string }[]>([]);
  /** Earliest day to agree on, where there is one. */
  readonly from = input('');
  readonly submitWords = input.required<string>();
  readonly keepAs = input.required<string>();
  readonly busy = input(false);
  readonly problem = input<Problem>();
  readonly send = output<TypedAction>();
  readonly leave = output();

  private readonly kept = inject(KeptText);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  protected readonly measures = BRANCH_MEASURES.map((value) => ({
    value,
    name: MEASURE_NAMES[value],
  }));
  protected readonly form = inject(NonNullableFormBuilder).group({
    branch: ['', Validators.required],
    what: ['', [Validators.required, SAID, Validators.maxLength(4000)]],
    who: ['', [Validators.required, SAID, Validators.maxLength(120)]],
    until: ['', Validators.required],
    measure: this.measureControl(),
  });

  constructor() {
    effect(() => {
      const at = this.at();
      const draft = parseTyped(untracked(() => this.kept.read(this.keepAs())));
      this.form.reset({ ...at, ...draft }, { emitEvent: false });
    });
    effect(() => markFields(this.form, this.problem()));
  }

  /** Keeps what stands in the fields, at every key. */
  protected keep(): void {
    this.kept.keep(this.keepAs(), JSON.stringify(this.form.getRawValue()));
  }

  protected submit(): void {
    this.form.markAllAsTouched();
    // A field refused by the server is tried again as it stands now.
    for (const control of Object.values(this.form.controls)) control.updateValueAndValidity();
    if (this.form.invalid) {
      this.focusFirstWrong();
      return;
    }
    const typed = this.form.getRawValue();
    this.send.emit({ ...typed, what: typed.what.trim(), who: typed.who.trim() });
  }

  protected throwAway(): void {
    this.kept.forget(this.keepAs());
    this.form.reset({ ...this.at() });
    this.leave.emit();
  }

  private focusFirstWrong(): void {
    const [name] = Object.entries(this.form.controls).find(([, control]) => control.invalid) ?? [];
    this.host.querySelector<HTMLElement>(`[formControlName=${name}]`)?.focus();
  }

  private measureControl() {
    return inject(NonNullableFormBuilder).control<BranchMeasure>('margin');
  }
}
