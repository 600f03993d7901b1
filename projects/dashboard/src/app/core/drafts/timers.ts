import type { JobDraft } from '#shared/contracts/under-way';
import { STAGES } from '#shared/domain/vocabulary';

const MINUTE = 60_000;

/** Whole minutes that a timer has run, to the nearest; 0 where the device's clock was set back meanwhile. */
export function minutesRunning(startedAt: string, now: Date): number {
  return Math.max(0, Math.round((now.getTime() - Date.parse(startedAt)) / MINUTE));
}

/** The draft with every running timer stopped and its minutes added to those of its stage. */
export function withTimersStopped(draft: JobDraft, now: Date): JobDraft {
  const { timers, ...rest } = draft;
  if (!timers) return draft;
  const stages = { ...rest.actual?.stages };
  for (const stage of STAGES) {
    const timer = timers[stage];
    if (timer) stages[stage] = (stages[stage] ?? 0) + minutesRunning(timer.startedAt, now);
  }
  return { ...rest, actual: { stages } };
}
