import { STAGES, type Stage } from '#shared/domain/vocabulary';
import { minutesRunning } from '../../core/drafts/timers';
import { type DraftDocument, valueAt, withValue } from './draft-document';

/** After this a timer was more likely left on than worked through, in minutes. Common practice, no source. */
export const LONG_RUN = 600;

/** Starts the timer of a stage; its beginning is kept, so that it runs on while the phone is closed. */
export function startTimer(document: DraftDocument, stage: Stage, now: number): DraftDocument {
  if (document.timers?.[stage]) return document;
  return withValue(document, `/timers/${stage}`, { startedAt: new Date(now).toISOString() });
}

/** Stops the timer of a stage and adds what it ran to the stage's minutes. */
export function stopTimer(document: DraftDocument, stage: Stage, now: number): DraftDocument {
  const ran = minutesRun(document, stage, now);
  const written = minutesWritten(document, stage) ?? 0;
  const stopped = withValue(document, `/timers/${stage}`, undefined);
  return withValue(stopped, `/actual/stages/${stage}`, written + ran);
}

/** Whole minutes that the timer of a stage has run so far; 0 when it does not. */
export function minutesRun(document: DraftDocument, stage: Stage, now: number): number {
  const startedAt = document.timers?.[stage]?.startedAt;
  return startedAt === undefined ? 0 : minutesRunning(startedAt, new Date(now));
}

/** Minutes written down for a stage, without what its timer has run since. */
export function minutesWritten(document: DraftDocument, stage: Stage): number | undefined {
  return document.actual?.stages[stage];
}

/** Adds minutes to a stage or takes some off; never below none. */
export function addMinutes(document: DraftDocument, path: string, minutes: number): DraftDocument {
  const before = valueAt(document, path);
  const after = Math.max(0, (typeof before === 'number' ? before : 0) + minutes);
  return withValue(document, path, after);
}

/** The stages whose timers run. */
export function running(document: DraftDocument): readonly Stage[] {
  return STAGES.filter((stage) => document.timers?.[stage] !== undefined);
}
