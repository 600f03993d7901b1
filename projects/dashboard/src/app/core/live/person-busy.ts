import { DestroyRef, DOCUMENT, inject, Injectable } from '@angular/core';

/** So long after the last key a person is still typing, ms. */
const TYPING = 5_000;
const FIELD = 'input:not([type=checkbox], [type=radio], [type=button]), textarea, select';

/** Whether the person at the page is in the middle of something that a change of the page would disturb. */
@Injectable({ providedIn: 'root' })
export class PersonBusy {
  private readonly document = inject(DOCUMENT);
  private readonly begun = new Set<HTMLFormElement>();
  private typedAt = -Infinity;

  constructor() {
    const typed = ({ target }: Event): void => {
      this.typedAt = performance.now();
      const form = target instanceof Element ? target.closest('form') : null;
      if (form) this.begun.add(form);
    };
    const done = ({ target }: Event): void => {
      this.begun.delete(target as HTMLFormElement);
    };
    this.document.addEventListener('input', typed, true);
    this.document.addEventListener('submit', done, true);
    inject(DestroyRef).onDestroy(() => {
      this.document.removeEventListener('input', typed, true);
      this.document.removeEventListener('submit', done, true);
    });
  }

  /** Typing, a form with something typed in it or about to be, a dialog, menu or list that is open. */
  now(): boolean {
    if (performance.now() - this.typedAt < TYPING) return true;
    if (this.document.querySelector('.cdk-overlay-pane:not(:empty), dialog[open]')) {
      return true;
    }
    // A search is not lost by what comes in; everything else that is typed might be.
    const focused = this.document.activeElement;
    if (focused?.matches(FIELD) && isKept(focused.closest('form'))) return true;
    for (const form of this.begun) if (!form.isConnected) this.begun.delete(form);
    return [...this.begun].some(isKept);
  }
}

function isKept(form: HTMLFormElement | null): boolean {
  return form !== null && form.getAttribute('role') !== 'search';
}
