import type { SentImport } from '#db/queries/imports';
import { notFound, Refusal } from '#shared/domain/refusal';

/** Refuses to read a file another way once a row of it may be written. */
export function refuseCorrecting(found: SentImport | undefined): asserts found is SentImport {
  if (!found) throw notFound();
  if (found.rowsDone === 0 && found.state !== 'writing' && found.state !== 'done') return;
  throw new Refusal(
    'conflict',
    'This file is being written or was written already; send it again to read it another way.',
  );
}

/** Refuses to write a file that is not there to be written. */
export function refuseConfirming(found: SentImport | undefined): asserts found is SentImport {
  if (!found) throw notFound();
  const told = TOLD[found.state];
  if (told !== undefined) throw new Refusal('conflict', told);
  if (found.rowsOf === null || found.counts.rows < found.rowsOf) {
    throw new Refusal('conflict', 'This file was not checked to its end; have it checked again.');
  }
}

/** The bytes of a file are let go of some time after it ended. */
export function refuseGone(kept: boolean): void {
  if (!kept) throw new Refusal('conflict', 'This file is no longer kept; send it again.');
}

const TOLD: Partial<Record<SentImport['state'], string>> = {
  checking: 'This file is still being checked.',
  writing: 'This file is being written already.',
  done: 'This file was written already; to bring it in again, send it again.',
  failed: 'This file cannot be read; nothing of it can be written.',
};
