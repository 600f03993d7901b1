import { DOCUMENT, inject, Injectable } from '@angular/core';

/** Keeps what is being written until it is sent, under a name of its own, through a reload or a look at another page; gone with the tab. */
@Injectable({ providedIn: 'root' })
export class KeptText {
  private readonly storage = inject(DOCUMENT).defaultView?.sessionStorage;

  read(name: string): string | undefined {
    try {
      return this.storage?.getItem(keyOf(name)) ?? undefined;
    } catch {
      // A browser may refuse storage; the text then lives in the form alone.
      return undefined;
    }
  }

  /** Keeps it; nothing is kept of an empty text. */
  keep(name: string, text: string): void {
    try {
      if (text === '') this.storage?.removeItem(keyOf(name));
      else this.storage?.setItem(keyOf(name), text);
    } catch {
      // As above.
    }
  }

  forget(name: string): void {
    this.keep(name, '');
  }
}

function keyOf(name: string): string {
  return `underseam.text.${name}`;
}
