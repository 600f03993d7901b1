import type { Scope } from '#db/scope';
import type { SignalWriter } from '#db/signal-writer';
import type { Signal } from '#shared/contracts/signals';
import { notFound, Refusal } from '#shared/domain/refusal';

/** Who takes note of a signal, when, and what they may see. */
export interface Acknowledging {
  actor: Parameters<SignalWriter['acknowledge']>[2]['actor'];
  at: string;
  reach: Scope;
}

/**
 * Notes that a signal has been seen and what is done about it. A later note takes the place of the one before, which stays in
 * the trail; the same note again writes nothing. Runs inside a write, for a look may end a signal meanwhile.
 */
export function acknowledge(
  writer: SignalWriter,
  id: number,
  sent: string,
  { actor, at, reach }: Acknowledging,
): Signal {
  const before = writer.find(id, reach);
  if (!before) throw notFound();
  if (before.overOn !== null) {
    throw new Refusal(
      'conflict',
      `This signal has been over since ${before.overOn}; there is nothing left to take note of.`,
    );
  }
  const note = sent.normalize('NFC').trim();
  if (before.acknowledged?.note === note) return before;
  writer.acknowledge(before, note, { actor, at });
  const after = writer.find(id, reach);
  if (!after) throw notFound();
  return after;
}
