import { isDate } from './calendar';
import type { RuleBreak } from './job-rules';

/**
 * The rules of a mark on a finding left on a car that reach beyond its own fields: over the raw body, silent wherever a field
 * has not the right shape. An owner is told after the finding was made and not in the future; nothing is due before it.
 */
export function breaksOfMark(body: unknown, completedOn: string, today: string): RuleBreak[] {
  if (typeof body !== 'object' || body === null || Array.isArray(body)) return [];
  const { dueOn, ownerToldOn } = body as Record<string, unknown>;
  const breaks: RuleBreak[] = [];
  for (const [path, on] of [
    ['/dueOn', dueOn],
    ['/ownerToldOn', ownerToldOn],
  ] as const) {
    if (typeof on === 'string' && isDate(on) && on < completedOn) {
      breaks.push({ path, message: `is before the job was completed (${completedOn})` });
    }
  }
  if (typeof ownerToldOn === 'string' && isDate(ownerToldOn) && ownerToldOn > today) {
    breaks.push({
      path: '/ownerToldOn',
      message: `lies in the future (today is ${today} at this branch)`,
    });
  }
  return breaks;
}
