import type { ActionDeed, ActionWriter } from '#db/action-writer';
import type { ActionRow } from '#db/queries/actions';
import type { agreeAction, changeAction } from '#shared/contracts/actions';
import type { FieldProblem } from '#shared/contracts/fields';
import { notFound, refuseInput } from '#shared/domain/refusal';
import type * as z from 'zod';

type Agreed = z.output<typeof agreeAction.body>;
type Changed = z.output<typeof changeAction.body>;

/** Agrees an action with the writer's branch; inside a write. Refuses a day that is over and a signal of no or another branch. */
export function agree(
  writer: ActionWriter,
  { signal, ...sent }: Agreed,
  today: string,
  deed: ActionDeed,
): ActionRow {
  const problems = breaksOfUntil(sent.until, today);
  if (signal !== undefined && !writer.hasSignal(signal)) {
    problems.push({ path: '/signal', message: 'is no signal of this branch' });
  }
  if (problems.length > 0) throw refuseInput(problems);
  const action = { ...sent, what: tidied(sent.what), who: tidied(sent.who) };
  return found(writer, writer.agree(action, today, signal ?? null, deed));
}

/** Changes an action, ends it or takes it up again; what is left out stays, and the same again writes nothing. Inside a write. */
export function change(
  writer: ActionWriter,
  id: number,
  sent: Changed,
  today: string,
  deed: ActionDeed,
): ActionRow {
  const before = found(writer, id);
  const after = {
    what: sent.what === undefined ? before.what : tidied(sent.what),
    who: sent.who === undefined ? before.who : tidied(sent.who),
    until: sent.until ?? before.until,
    measure: sent.measure ?? before.measure,
    state: sent.state ?? before.state,
  };
  // A day that was agreed may be over; another one may not be chosen in the past.
  const problems = after.until === before.until ? [] : breaksOfUntil(after.until, today);
  if (problems.length > 0) throw refuseInput(problems);
  const same = (Object.keys(after) as (keyof typeof after)[]).every(
    (field) => after[field] === before[field],
  );
  if (same) return before;
  const endedOn =
    after.state === 'agreed' ? null : after.state === before.state ? before.endedOn : today;
  writer.change(before, after, endedOn, deed);
  return found(writer, id);
}

/** Adds what the branch says; inside a write. */
export function answer(
  writer: ActionWriter,
  id: number,
  text: string,
  deed: ActionDeed,
): ActionRow {
  found(writer, id);
  writer.answer(id, tidied(text), deed);
  return found(writer, id);
}

function found(writer: ActionWriter, id: number): ActionRow {
  const row = writer.find(id);
  if (!row) throw notFound();
  return row;
}

function breaksOfUntil(until: string, today: string): FieldProblem[] {
  return until < today ? [{ path: '/until', message: `is over; choose ${today} or later` }] : [];
}

function tidied(text: string): string {
  return text.normalize('NFC').trim();
}
