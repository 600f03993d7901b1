import { DOCUMENT, inject, Injectable } from '@angular/core';
import { isDate } from '#shared/domain/calendar';
import { COME_BACK_STATUSES, type ComeBackStatus } from '#shared/domain/vocabulary';

/** What stands in the form of a finding; empty text where a date is not given. */
export interface TypedMark {
  readonly status: ComeBackStatus;
  readonly dueOn: string;
  readonly note: string;
  readonly ownerToldOn: string;
}

/** Keeps a mark that is being written until it is saved, through a reload or a look at another page; gone with the tab. */
@Injectable({ providedIn: 'root' })
export class ComeBackDrafts {
  private readonly storage = inject(DOCUMENT).defaultView?.sessionStorage;

  read(key: string): TypedMark | undefined {
    try {
      return parse(this.storage?.getItem(nameOf(key)) ?? '');
    } catch {
      // A browser may refuse storage; the draft then lives in the form alone.
      return undefined;
    }
  }

  keep(key: string, typed: TypedMark): void {
    try {
      this.storage?.setItem(nameOf(key), JSON.stringify(typed));
    } catch {
      // As above: nothing is lost that is still on the screen.
    }
  }

  forget(key: string): void {
    try {
      this.storage?.removeItem(nameOf(key));
    } catch {
      // As above.
    }
  }
}

function nameOf(key: string): string {
  return `underseam.come-back.${key}`;
}

/** A draft of an older release or of another hand may hold anything. */
function parse(text: string): TypedMark | undefined {
  if (!text) return undefined;
  const found = JSON.parse(text) as Partial<Record<keyof TypedMark, unknown>>;
  const status = COME_BACK_STATUSES.find((one) => one === found.status);
  if (!status) return undefined;
  const dateOf = (value: unknown): string =>
    typeof value === 'string' && isDate(value) ? value : '';
  return {
    status,
    dueOn: dateOf(found.dueOn),
    note: typeof found.note === 'string' ? found.note : '',
    ownerToldOn: dateOf(found.ownerToldOn),
  };
}
