import type { JobFilters } from '#db/queries/job-filters';
import type { Scope } from '#db/scope';
import type { FieldProblem, ScopeQuery } from '#shared/contracts/fields';
import { breaksOfWeeks, periodOf, type Period } from '#shared/domain/period';
import { refuseInput } from '#shared/domain/refusal';
import { todayIn } from '../clock';
import type { Kit } from '../kit';

/** What an analytics call asks about, ready for a worker. */
export interface ScopeQuestion {
  scope: Scope;
  period: Period;
  filters: JobFilters;
  today: string;
}

/** Reads the filters that every analytics call takes: scope narrowed (rule 22), period filled in (rule 9), packages found. */
export function scopeQuestion(kit: Kit, allowed: Scope, query: ScopeQuery): ScopeQuestion {
  const scope = allowed.narrow(query);
  const today = todayIn(scope, kit.clock);
  const period = periodOf(query, today);
  const problems: FieldProblem[] = breaksOfWeeks(period);
  const packageIds = findPackages(kit, query.package, problems);
  if (problems.length > 0) throw refuseInput(problems);
  return { scope, period, filters: { packageIds, bodyTypes: query.bodyType }, today };
}

/** The ids of the packages asked for; unknown words are named (rule 60). */
export function findPackages(
  kit: Kit,
  codes: readonly string[] | undefined,
  problems: FieldProblem[],
): number[] | undefined {
  return codes?.flatMap((code) => {
    const entry = kit.store.state.package(code);
    if (entry) return [entry.id];
    problems.push({ path: '/query/package', message: 'no package has this code' });
    return [];
  });
}
