import type { RiskStep } from '#shared/stats/risk-step';

/** One subject: when it was last seen, and whether with the event (1) or without (0). */
export interface Followed {
  time: number;
  status: number;
}

/** The steps of a group at given times: an event at a time comes before a leaving at that time. */
export function stepsAt(times: readonly number[], group: readonly Followed[]): RiskStep[] {
  return times.map((time) => ({
    atRisk: group.filter((one) => one.time >= time).length,
    events: group.filter((one) => one.time === time && one.status === 1).length,
  }));
}

/** The times at which anybody had the event, in order. */
export function eventTimes(everyone: readonly Followed[]): number[] {
  const times = everyone.filter((one) => one.status === 1).map((one) => one.time);
  return [...new Set(times)].sort((a, b) => a - b);
}
