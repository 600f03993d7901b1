import type { Scope } from '#db/scope';
import type { JobFilters } from '#db/queries/job-filters';
import type { FieldProblem, ScopeQuery } from '#shared/contracts/fields';
import { breaksOfPeriod } from '#shared/domain/period';
import { refuseInput } from '#shared/domain/refusal';
import { todayIn } from '../clock';
import type { Kit } from '../kit';
import { findPackages } from './scope-question';

/** What warranty figures are asked about. Days that were not asked for are left to the first job and the as-of day (rule 15). */
export interface CoverAsked {
  scope: Scope;
  asOf: string;
  from: string | undefined;
  to: string | undefined;
  filters: Pick<JobFilters, 'packageIds' | 'bodyTypes'>;
}

/** Reads what the warranty calls have in common: as of which day (today, never later) and which jobs; `more` is what else is wrong. */
export function coverQuestion(
  kit: Kit,
  allowed: Scope,
  query: ScopeQuery & { asOf?: string | undefined },
  more: readonly FieldProblem[] = [],
): CoverAsked {
  const scope = allowed.narrow(query);
  const today = todayIn(scope, kit.clock);
  const { asOf = today, from, to } = query;
  const problems = [
    ...(asOf > today ? [{ path: '/query/asOf', message: `is after today (${today})` }] : []),
    ...(from === undefined ? [] : breaksOfPeriod({ from, to: to ?? asOf })),
    ...more,
  ];
  if (problems.length > 0) throw refuseInput(problems);
  const filters = { packageIds: findPackages(kit, query.package), bodyTypes: query.bodyType };
  return { scope, asOf, from, to, filters };
}

/** What is wrong with the groups asked for: more than can be told apart in one picture. */
export function breaksOfGroups(
  groups: readonly string[] | undefined,
  most: number,
): FieldProblem[] {
  if (new Set(groups).size <= most) return [];
  return [{ path: '/query/group', message: `at most ${most} groups are compared at once` }];
}
