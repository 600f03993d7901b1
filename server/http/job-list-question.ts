import type { ListFilters } from '#db/queries/job-list';
import type { Scope } from '#db/scope';
import type { FieldProblem } from '#shared/contracts/fields';
import type { jobsQuery } from '#shared/contracts/job-list';
import { localDate } from '#shared/domain/calendar';
import { breaksOfPeriod } from '#shared/domain/period';
import { refuseInput } from '#shared/domain/refusal';
import { AGE_BANDS } from '#shared/domain/vocabulary';
import type * as z from 'zod';
import type { Kit } from '../kit';
import { findPackages } from './scope-question';

type JobsQuery = Omit<z.output<typeof jobsQuery>, 'limit' | 'cursor' | 'sort'>;

/** Reads the filters of the list of jobs, which has no default period. */
export function jobListQuestion(
  kit: Kit,
  allowed: Scope,
  query: JobsQuery,
): { scope: Scope; filters: ListFilters; todayByBranch: Record<string, string> } {
  const scope = allowed.narrow(query);
  const { from, to } = query;
  const problems: FieldProblem[] =
    from !== undefined && to !== undefined ? breaksOfPeriod({ from, to }) : [];
  const packageIds = findPackages(kit, query.package, problems);
  if (problems.length > 0) throw refuseInput(problems);
  const now = kit.clock.now();
  return {
    scope,
    filters: {
      from,
      to,
      packageIds,
      bodyTypes: query.bodyType,
      make: query.make,
      model: query.model,
      ageBandIndex: query.ageBand && AGE_BANDS.indexOf(query.ageBand),
      unbilled: query.unbilled,
      hasRot: query.hasRot,
      hasEstimate: query.hasEstimate,
      text: query.q,
    },
    todayByBranch: Object.fromEntries(
      scope.branches.map(({ code, timeZone }) => [code, localDate(now, timeZone)]),
    ),
  };
}
