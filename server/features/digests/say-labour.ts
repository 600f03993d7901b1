import { FEWEST_CARS } from '#shared/domain/small-samples';
import type { Stage } from '#shared/domain/vocabulary';
import { counted, minutes, signedPercent } from './in-words';
import type { WeekLabour } from './week-digest';

/** What labour took against its estimates, and in which stage most of it. */
export function sayLabour({ cars, estimatedMinutes, actualMinutes, stages }: WeekLabour): string {
  if (cars === 0) return 'No car of it had an estimate to be held against.';
  const over = actualMinutes - estimatedMinutes;
  // A share of a few cars says nothing (rule 13); the minutes are counts.
  const share =
    cars < FEWEST_CARS ? '' : `${signedPercent(actualMinutes / estimatedMinutes - 1)}, `;
  const of = `(${share}${counted(cars, 'car', 'cars')})`;
  if (over === 0) return `Labour took exactly what was estimated ${of}.`;
  if (over < 0) return `Labour stayed ${minutes(over)} under its estimates ${of}.`;
  const most = mostOver(stages);
  const where = most ? `, most of all in ${most.stage} (+${minutes(most.overMinutes)})` : '';
  return `Labour ran ${minutes(over)} over its estimates ${of}${where}.`;
}

function mostOver(stages: WeekLabour['stages']) {
  return stages.reduce<{ stage: Stage; overMinutes: number } | undefined>(
    (most, stage) => (stage.overMinutes > (most?.overMinutes ?? 0) ? stage : most),
    undefined,
  );
}
