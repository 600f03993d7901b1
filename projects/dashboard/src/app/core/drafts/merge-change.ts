import type { JobDraft } from '#shared/contracts/under-way';
import type { DeviceDraft, DraftChange } from './device-draft';

/** A change brought onto what is kept by now. */
export interface Merged {
  readonly draft: DeviceDraft;
  /** Whether something was changed differently in two windows, so that one of the two is no longer in the draft. */
  readonly clash: boolean;
}

/**
 * Brings a change that was made to `seen` onto `kept`, which another window may have changed meanwhile: fields that only one
 * of the two changed are taken from it; where both did, the change at hand stands and the clash is told.
 */
export function mergeChange(kept: DeviceDraft, seen: DeviceDraft, change: DraftChange): Merged {
  const { content, step, ...rest } = change;
  const outer = merge(kept, seen, rest);
  const inner = content ? mergeContent(kept.content, seen.content, content) : undefined;
  return {
    draft: {
      ...kept,
      ...outer.taken,
      ...(inner && { content: inner.taken }),
      ...(step !== undefined && { step }),
    },
    clash: outer.clash || (inner?.clash ?? false),
  };
}

/** Whether a change touches what is sent; standing at another step does not. */
export function touchesContent({ content, branch, jobRef, corrects }: DraftChange): boolean {
  return [content, branch, jobRef, corrects].some((value) => value !== undefined);
}

/** The whole content is handed over at every change: a field that is not in it any more was taken out. */
function mergeContent(
  kept: JobDraft,
  seen: JobDraft,
  next: JobDraft,
): { taken: JobDraft; clash: boolean } {
  const removed = Object.fromEntries(Object.keys(seen).map((name) => [name, undefined]));
  const { taken, clash } = merge<JobDraft>(kept, seen, { ...removed, ...next });
  const all: Readonly<Record<string, unknown>> = { ...kept, ...taken };
  const filled = Object.entries(all).filter(([, value]) => value !== undefined);
  return { taken: Object.fromEntries(filled), clash };
}

function merge<Whole extends object>(
  kept: Whole,
  seen: Whole,
  change: Partial<Whole>,
): { taken: Partial<Whole>; clash: boolean } {
  const taken: Partial<Whole> = {};
  let clash = false;
  for (const name of Object.keys(change) as (keyof Whole)[]) {
    if (same(change[name], seen[name])) continue;
    taken[name] = change[name];
    clash ||= !same(kept[name], seen[name]) && !same(kept[name], change[name]);
  }
  return { taken, clash };
}

function same(one: unknown, other: unknown): boolean {
  return JSON.stringify(one) === JSON.stringify(other);
}
