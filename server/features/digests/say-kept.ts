import type { MarginWeek } from '#shared/contracts/margin';
import { counted, percent, percentRange, weekNumber } from './in-words';
import type { WeekFigures } from './week-digest';

/** What a week kept of what it billed, against its usual range and its target; or why that cannot be said. */
export function sayKept(figures: WeekFigures): string {
  const { week, weeks, costed } = figures;
  const last = weeks.at(-1);
  const name = weekNumber(week);
  if (!last || last.jobs === 0) return `No car was finished in ${lowerFirst(name)}.`;
  if (last.jobs === last.unbilled) {
    return `${name} finished ${counted(last.jobs, 'car', 'cars')} and has billed none of them yet.`;
  }
  if (costed === 0) {
    return `What ${lowerFirst(name)} kept cannot be said until head office sets a cost that is missing.`;
  }
  const cars = counted(costed, 'car', 'cars');
  if (last.marginShare === null) {
    return `${name} billed nothing (${cars}), so no share of it can be kept.`;
  }
  return keptOf(figures, last.marginShare, last.signal, cars);
}

function keptOf(
  { week, limits, targetMarginShare }: WeekFigures,
  share: number,
  signal: MarginWeek['signal'],
  cars: string,
): string {
  const digits = limits ? digitsFor(share, limits) : 0;
  const kept = `${weekNumber(week)} kept ${percent(share, digits)} of what it billed (${cars})`;
  const target = againstTarget(share, targetMarginShare);
  if (!limits) {
    const unknown = 'what is usual here can be said once 8 earlier weeks are billed';
    return `${kept}${target && `, ${target}`}; ${unknown}.`;
  }
  const range = `its usual ${percentRange(limits.lower, limits.upper, digits)}`;
  return `${kept}, ${against(signal, range, limits.centre)}${target && ` and ${target}`}.`;
}

function against(signal: MarginWeek['signal'], range: string, centre: number): string {
  switch (signal) {
    case 'outside_low':
      return `below ${range}`;
    case 'outside_high':
      return `above ${range}`;
    case 'run_low':
      return `inside ${range} but for eight or more weeks running below its middle of ${percent(centre)}`;
    case 'run_high':
      return `inside ${range} but for eight or more weeks running above its middle of ${percent(centre)}`;
    case null:
      return `inside ${range}`;
  }
}

/** A target is wished for, not usual: said beside the range, never in its place. */
function againstTarget(share: number, target: number | null): string {
  if (target === null) return '';
  const [shown, wanted] = [Math.round(share * 100), Math.round(target * 100)];
  if (shown === wanted) return `at its target of ${percent(target)}`;
  return `${shown < wanted ? 'below' : 'above'} its target of ${percent(target)}`;
}

/** One decimal where whole per cent would read as a contradiction: 46 % "above 31–46 %". */
function digitsFor(share: number, { lower, upper }: { lower: number; upper: number }): number {
  const outside = share < lower || share > upper;
  const reads = percent(share);
  return outside && (reads === percent(lower) || reads === percent(upper)) ? 1 : 0;
}

function lowerFirst(text: string): string {
  return text.charAt(0).toLowerCase() + text.slice(1);
}
