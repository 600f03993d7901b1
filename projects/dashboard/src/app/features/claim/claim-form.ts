import { inject, linkedSignal, type Signal } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { NonNullableFormBuilder } from '@angular/forms';
import { map } from 'rxjs';
import type { Problem } from '../../core/api/problem';
import type { TypedClaim } from '../../core/drafts/claim-draft';
import { fieldProblems } from './field-problems';
import { emptyClaim, type TypedProblems } from './typed-claim';

/** What is being typed of a claim, and what is wrong with it until it is changed. Made in an injection context. */
export class ClaimForm {
  readonly group = inject(NonNullableFormBuilder).group<TypedClaim>(emptyClaim(''));
  readonly typed: Signal<TypedClaim> = toSignal(
    this.group.valueChanges.pipe(map(() => this.group.getRawValue())),
    { initialValue: this.group.getRawValue() },
  );
  /** By field; a problem goes when its field is changed. */
  readonly problems = linkedSignal<TypedClaim, TypedProblems>({
    source: this.typed,
    computation: (now, before) =>
      Object.fromEntries(
        Object.entries(before?.value ?? {}).filter(
          ([name]) => now[name as keyof TypedClaim] === before?.source[name as keyof TypedClaim],
        ),
      ),
  });

  set(change: Partial<TypedClaim>): void {
    this.group.patchValue(change);
    this.group.markAsDirty();
  }

  /** Shows what is wrong with fields of the form. */
  mark(problems: TypedProblems): void {
    this.problems.set(problems);
    for (const [name, words] of Object.entries(problems)) {
      const control = this.group.get(name);
      control?.setErrors({ words });
      control?.markAsTouched();
    }
  }

  /** Shows what the server says of fields. */
  refused(problem: Problem): void {
    this.mark(fieldProblems(problem));
  }
}
