import type { JobFilters } from '#db/queries/job-filters';
import type { Scope } from '#db/scope';
import type { ScopeQuery } from '#shared/contracts/fields';
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
  const problems = breaksOfWeeks(period);
  if (problems.length > 0) throw refuseInput(problems);
  return {
    scope,
    period,
    filters: { packageIds: findPackages(kit, query.package), bodyTypes: query.bodyType },
    today,
  };
}

/** The ids of the packages asked for; a word that is none was refused with the query (rule 60). */
export function findPackages(kit: Kit, codes: readonly string[] | undefined): number[] | undefined {
  return codes?.flatMap((code) => kit.store.state.package(code)?.id ?? []);
}
