import type { ClaimFilters } from '#db/queries/claim-list';
import type { Scope } from '#db/scope';
import type { claimsQuery } from '#shared/contracts/claim-list';
import type { FieldProblem } from '#shared/contracts/fields';
import { breaksOfPeriod } from '#shared/domain/period';
import { refuseInput } from '#shared/domain/refusal';
import { AGE_BANDS } from '#shared/domain/vocabulary';
import type * as z from 'zod';
import { todayIn } from '../clock';
import type { Kit } from '../kit';
import { findPackages } from './scope-question';

type ClaimsQuery = Omit<z.output<typeof claimsQuery>, 'limit' | 'cursor' | 'sort'>;

/** Reads the filters of the list of claims, which has no default period, and the day as of which claims count (rule 14). */
export function claimListQuestion(
  kit: Kit,
  allowed: Scope,
  query: ClaimsQuery,
): { scope: Scope; filters: ClaimFilters; asOf: string } {
  const scope = allowed.narrow(query);
  const today = todayIn(scope, kit.clock);
  const { asOf = today, from, to } = query;
  const problems: FieldProblem[] =
    from !== undefined && to !== undefined ? breaksOfPeriod({ from, to }) : [];
  if (asOf > today) {
    problems.push({ path: '/query/asOf', message: `lies in the future (today is ${today})` });
  }
  if (query.jobRef !== undefined && new Set(query.branch).size !== 1) {
    // A reference is a branch's own: the same one elsewhere is another car.
    problems.push({ path: '/query/jobRef', message: 'needs one branch' });
  }
  if (problems.length > 0) throw refuseInput(problems);
  return {
    scope,
    filters: {
      from,
      to,
      packageIds: findPackages(kit, query.package),
      bodyTypes: query.bodyType,
      counted: query.counted,
      decision: query.decision,
      waiting: query.waiting,
      cause: query.cause,
      zone: query.zone,
      ageBandIndex: query.ageBand && AGE_BANDS.indexOf(query.ageBand),
      cohort: query.cohort === undefined ? undefined : daysOf(query.cohort),
      jobRef: query.jobRef?.normalize('NFC'),
      text: query.q,
    },
    asOf,
  };
}

/** First and last day of a half-year as `2024-H1` names it. */
function daysOf(halfYear: string): { from: string; to: string } {
  const year = halfYear.slice(0, 4);
  return halfYear.endsWith('H1')
    ? { from: `${year}-01-01`, to: `${year}-06-30` }
    : { from: `${year}-07-01`, to: `${year}-12-31` };
}
