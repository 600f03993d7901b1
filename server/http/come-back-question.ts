import type { JobFilters } from '#db/queries/job-filters';
import type { Scope } from '#db/scope';
import type { comeBackQuery } from '#shared/contracts/come-back';
import type { FieldProblem } from '#shared/contracts/fields';
import { breaksOfPeriod } from '#shared/domain/period';
import { refuseInput } from '#shared/domain/refusal';
import { OPEN_COME_BACKS, type ComeBackStatus } from '#shared/domain/vocabulary';
import type * as z from 'zod';
import type { Kit } from '../kit';
import { findPackages } from './scope-question';

type ComeBackQuery = Omit<z.output<typeof comeBackQuery>, 'limit' | 'cursor'>;

/** Reads the filters of the come-back list, which has no default period and lists what is still to be dealt with (rule 61). */
export function comeBackQuestion(
  kit: Kit,
  allowed: Scope,
  query: ComeBackQuery,
): { scope: Scope; filters: JobFilters; statuses: readonly ComeBackStatus[] } {
  const { from, to } = query;
  const problems: FieldProblem[] =
    from !== undefined && to !== undefined ? breaksOfPeriod({ from, to }) : [];
  const packageIds = findPackages(kit, query.package);
  if (problems.length > 0) throw refuseInput(problems);
  return {
    scope: allowed.narrow(query),
    filters: { from, to, packageIds, bodyTypes: query.bodyType },
    statuses: query.status ?? OPEN_COME_BACKS,
  };
}
