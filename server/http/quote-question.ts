import type { Scope } from '#db/scope';
import type { FieldProblem } from '#shared/contracts/fields';
import type { quoteQuery } from '#shared/contracts/quote';
import { rateOfMicros } from '#shared/domain/money';
import { leavesNothing } from '#shared/domain/quote-price';
import { refuseInput } from '#shared/domain/refusal';
import type * as z from 'zod';
import { todayIn } from '../clock';
import type { QuoteQuestion } from '../features/quote/answer-quote';
import type { Kit } from '../kit';

/** Reads what a quote is asked for: its branch as the only scope, today there, and a margin that leaves a price. */
export function quoteQuestion(
  kit: Kit,
  allowed: Scope,
  { branch, package: code, ...car }: z.output<typeof quoteQuery>,
  money: QuoteQuestion['money'],
): QuoteQuestion & { scope: Scope } {
  // A branch out of scope leaves none, as one that does not exist (rule 22).
  const scope = allowed.narrow({ branch: [branch] });
  const today = todayIn(scope, kit.clock);
  const packageId = kit.store.state.package(code)?.id;
  if (packageId === undefined) throw new Error('a package that was found is gone');
  const problems: FieldProblem[] = [
    ...(car.firstRegistered > today.slice(0, 7)
      ? [{ path: '/query/firstRegistered', message: `is after this month (${today})` }]
      : []),
    ...breaksOfMargin(kit, car.marginShare, today),
  ];
  if (problems.length > 0) throw refuseInput(problems);
  return { marginShare: undefined, ...car, packageId, today, money, scope };
}

/** A margin must leave something of the price after the fee of today (rule 49). */
function breaksOfMargin(kit: Kit, marginShare: number | undefined, today: string): FieldProblem[] {
  const feeMicros = kit.store.state.costs.feeMicros(today);
  if (marginShare === undefined || feeMicros === undefined) return [];
  const feeRate = rateOfMicros(feeMicros);
  if (!leavesNothing(feeRate, marginShare)) return [];
  return [
    { path: '/query/marginShare', message: `leaves nothing of a price after a fee of ${feeRate}` },
  ];
}
