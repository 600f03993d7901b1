import type { ListFilters } from '#db/queries/job-list';
import type { Scope } from '#db/scope';
import type { FieldProblem } from '#shared/contracts/fields';
import type { jobsQuery } from '#shared/contracts/job-list';
import { localDate } from '#shared/domain/calendar';
import { breaksOfPeriod } from '#shared/domain/period';
import { refuseInput } from '#shared/domain/refusal';
import { placesMask } from '#shared/domain/rot-places';
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
  const packageIds = findPackages(kit, query.package);
  const productId = findProduct(kit, query.product, problems);
  problems.push(...breaksOfPairs(query));
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
      rotPlaces: query.zone && placesMask(query.zone, query.side),
      productId,
      productUse: query.use,
      text: query.q,
    },
    todayByBranch: Object.fromEntries(
      scope.branches.map(({ code, timeZone }) => [code, localDate(now, timeZone)]),
    ),
  };
}

/** The id of the product asked for; an unknown code is named, as that of a package is (rule 60). */
function findProduct(
  kit: Kit,
  code: string | undefined,
  problems: FieldProblem[],
): number | undefined {
  const id = code === undefined ? undefined : kit.store.state.productId(code);
  if (code !== undefined && id === undefined) {
    problems.push({ path: '/query/product', message: 'no product has this code' });
  }
  return id;
}

/** Filters that say something only beside another. */
function breaksOfPairs({ zone, side, product, use }: JobsQuery): FieldProblem[] {
  return [
    ...(side !== undefined && zone === undefined
      ? [{ path: '/query/side', message: 'needs a zone' }]
      : []),
    ...(use !== undefined && product === undefined
      ? [{ path: '/query/use', message: 'needs a product' }]
      : []),
  ];
}
