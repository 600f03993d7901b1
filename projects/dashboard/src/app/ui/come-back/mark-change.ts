import type { ComeBackMark } from '#shared/contracts/come-back';
import type { TypedMark } from './come-back-drafts';
import type { Markable } from './come-back-words';

/** A finding's marks as its form shows them. */
export function typedOf({ status, dueOn, note, ownerToldOn }: Markable): TypedMark {
  return { status, dueOn: dueOn ?? '', note, ownerToldOn: ownerToldOn ?? '' };
}

/** What to send: the status, and of the rest only what was changed, so that another's mark set meanwhile stays as it is. */
export function markChange(before: Markable, typed: TypedMark): ComeBackMark {
  const was = typedOf(before);
  const note = typed.note.trim();
  return {
    status: typed.status,
    ...(typed.dueOn === was.dueOn ? {} : { dueOn: typed.dueOn || null }),
    ...(note === was.note ? {} : { note: note || null }),
    ...(typed.ownerToldOn === was.ownerToldOn ? {} : { ownerToldOn: typed.ownerToldOn || null }),
  };
}

/** Whether anything in the form differs from what is kept. */
export function isChanged(before: Markable, typed: TypedMark): boolean {
  const was = typedOf(before);
  return (Object.keys(was) as (keyof TypedMark)[]).some((name) => was[name] !== typed[name]);
}
