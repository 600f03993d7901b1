import { InjectionToken } from '@angular/core';

/** How long to wait before the next try, ms, after so many that were not answered. */
export type RetryPace = (tries: number) => number;

const FIRST = 2_000;
const LONGEST = 120_000;

/**
 * Doubles from 2 s to 2 min, then a random quarter either way, so that a branch's phones do not all try at once when the line
 * comes back (common practice, no source).
 */
export const RETRY_PACE = new InjectionToken<RetryPace>('RETRY_PACE', {
  providedIn: 'root',
  factory: () => paceOf(() => Math.random()),
});

/** The pace for a source of chance between 0 and 1. */
export function paceOf(chance: () => number): RetryPace {
  return (tries) => {
    const steady = Math.min(LONGEST, FIRST * 2 ** Math.max(0, tries - 1));
    return Math.min(LONGEST, Math.max(FIRST, steady * (0.75 + chance() / 2)));
  };
}
