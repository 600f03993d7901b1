import { DOCUMENT, inject, Injectable } from '@angular/core';
import type { TypedClaim } from '../../core/drafts/claim-draft';
import { emptyClaim } from './typed-claim';

/** A correction being written, and the ETag of the claim that it was begun from. */
export interface CorrectionDraft {
  readonly typed: TypedClaim;
  readonly etag: string;
}

/** Keeps the correction of a claim until it is saved, through a reload or a look at another page; gone with the tab. */
@Injectable({ providedIn: 'root' })
export class CorrectionDrafts {
  private readonly storage = inject(DOCUMENT).defaultView?.sessionStorage;

  read(claim: string): CorrectionDraft | undefined {
    try {
      return parse(this.storage?.getItem(nameOf(claim)) ?? '');
    } catch {
      // A browser may refuse storage; the draft then lives in the form alone.
      return undefined;
    }
  }

  keep(claim: string, draft: CorrectionDraft): void {
    try {
      this.storage?.setItem(nameOf(claim), JSON.stringify(draft));
    } catch {
      // As above: nothing is lost that is still on the screen.
    }
  }

  forget(claim: string): void {
    try {
      this.storage?.removeItem(nameOf(claim));
    } catch {
      // As above.
    }
  }
}

function nameOf(claim: string): string {
  return `underseam.claim.${claim}`;
}

/** A draft of an older release or of another hand may hold anything. */
function parse(text: string): CorrectionDraft | undefined {
  if (!text) return undefined;
  const { typed, etag } = JSON.parse(text) as { typed?: Record<string, unknown>; etag?: unknown };
  if (typeof etag !== 'string' || typeof typed !== 'object') return undefined;
  const names = Object.keys(emptyClaim('')) as (keyof TypedClaim)[];
  const texts = names.map((name) => [name, typed[name]] as const);
  if (texts.some(([, value]) => typeof value !== 'string')) return undefined;
  return { etag, typed: Object.fromEntries(texts) as unknown as TypedClaim };
}
