import { DOCUMENT, inject, Injectable } from '@angular/core';

/** Keeps what is being written on a week until it is saved, through a reload or a look at another page; gone with the tab. */
@Injectable({ providedIn: 'root' })
export class NoteDrafts {
  private readonly storage = inject(DOCUMENT).defaultView?.sessionStorage;

  read(branch: string, week: string): string | undefined {
    try {
      return this.storage?.getItem(keyOf(branch, week)) ?? undefined;
    } catch {
      // A browser may refuse storage; the draft then lives in the form alone.
      return undefined;
    }
  }

  keep(branch: string, week: string, text: string): void {
    try {
      this.storage?.setItem(keyOf(branch, week), text);
    } catch {
      // As above: nothing is lost that is still on the screen.
    }
  }

  forget(branch: string, week: string): void {
    try {
      this.storage?.removeItem(keyOf(branch, week));
    } catch {
      // As above.
    }
  }
}

function keyOf(branch: string, week: string): string {
  return `underseam.note.${branch}.${week}`;
}
