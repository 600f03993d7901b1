import type { FormGroup } from '@angular/forms';
import type { Problem } from './problem';

/** Puts a problem's messages on the form's fields by JSON pointer (`/newPassword`), where they stay until the field is changed. */
export function markFields(form: FormGroup, problem: Problem | undefined): void {
  for (const { path, message } of problem?.fields ?? []) {
    const control = form.get(path.slice(1).split('/'));
    control?.setErrors({ server: message });
    control?.markAsTouched();
  }
}
