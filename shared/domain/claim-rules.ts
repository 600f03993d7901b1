import { isDate } from './calendar';
import type { RuleBreak } from './job-rules';

/**
 * The rules of a claim that need nothing but its own fields and the day (rule 59): over the raw body, silent wherever a field
 * has not the right shape.
 */
export function breaksOfClaim(body: unknown, today: string): RuleBreak[] {
  if (typeof body !== 'object' || body === null || Array.isArray(body)) return [];
  const claim = body as Record<string, unknown>;
  const breaks: RuleBreak[] = [];
  const made = dateOrNothing(claim['madeOn']);
  for (const field of ['madeOn', 'decidedOn', 'paidOn']) {
    const on = dateOrNothing(claim[field]);
    if (on === undefined) continue;
    if (on > today) {
      breaks.push({
        path: `/${field}`,
        message: `lies in the future (today is ${today} at this branch)`,
      });
    }
    if (made !== undefined && on < made) {
      breaks.push({ path: `/${field}`, message: `is before madeOn (${made})` });
    }
  }
  if (claim['paidOn'] !== undefined && claim['decision'] === 'open') {
    breaks.push({ path: '/paidOn', message: 'a claim is paid only once it is decided' });
  }
  return breaks;
}

function dateOrNothing(value: unknown): string | undefined {
  return typeof value === 'string' && isDate(value) ? value : undefined;
}
