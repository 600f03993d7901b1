/** One moment in time order: who was at risk just before it, and how many of them had the event then. */
export interface RiskStep {
  atRisk: number;
  events: number;
}

/** Throws where a step cannot be: counts that are not whole, or more events than were at risk. */
export function requireStep(atRisk: number, events: number): void {
  const counts = Number.isSafeInteger(atRisk) && Number.isSafeInteger(events);
  if (!counts || events < 0 || events > atRisk) {
    throw new RangeError(`events must be from 0 to those at risk, got ${events} of ${atRisk}`);
  }
}
