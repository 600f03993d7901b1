import type { FoundSignal } from './found-signal';

/** A kept signal that is not over. */
export interface KeptSignal {
  id: number;
  branchId: number;
  kind: string;
  key: string;
  since: string;
}

/** What a look makes of the kept signals. */
export interface Reconciled {
  opened: FoundSignal[];
  /** Still there, as found now. */
  kept: { id: number; found: FoundSignal }[];
  /** Over. */
  ended: number[];
}

/**
 * Holds what a look found against the signals that are not over. One of a kind, branch and key stays the same one for as long
 * as it is found; one that is found no more is over. Looking twice at the same finds nothing new.
 */
export function reconcile(
  before: readonly KeptSignal[],
  found: readonly FoundSignal[],
): Reconciled {
  const left = new Map(before.map((signal) => [nameOf(signal), signal]));
  const result: Reconciled = { opened: [], kept: [], ended: [] };
  const seen = new Set<string>();
  for (const signal of found) {
    const name = nameOf(signal);
    if (seen.has(name)) continue;
    const known = left.get(name);
    if (!known && signal.weight === 'keep') continue;
    seen.add(name);
    left.delete(name);
    if (known) result.kept.push({ id: known.id, found: continued(signal, known) });
    else result.opened.push(signal);
  }
  result.ended = [...left.values()].map(({ id }) => id);
  return result;
}

/** A branch left the funnel when it was first seen outside; every other kind knows by itself since when it is. */
function continued(found: FoundSignal, { since }: KeptSignal): FoundSignal {
  return found.kind === 'left_funnel' ? { ...found, since } : found;
}

function nameOf({ branchId, kind, key }: Pick<KeptSignal, 'branchId' | 'kind' | 'key'>): string {
  return `${branchId} ${kind} ${key}`;
}
