import type { FieldProblem } from '#shared/contracts/fields';
import { getQuote } from '#shared/contracts/quote';
import { rateOfMicros } from '#shared/domain/money';
import { leavesNothing } from '#shared/domain/quote-price';
import { Refusal, refuseInput } from '#shared/domain/refusal';
import { moneyFor } from '../../auth/caller';
import { todayIn } from '../../clock';
import { mount, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';

/** What the next car is likely to take, computed in a worker. */
export function mountQuote(mounting: Mounting, kit: Kit): void {
  mount(
    mounting,
    getQuote,
    async (call) => {
      const { branch, package: code, ...car } = call.query;
      const money = moneyFor(call.caller);
      // A branch out of scope leaves none, as one that does not exist (rule 22).
      const scope = call.scope.narrow({ branch: [branch] });
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
      const question = { ...car, packageId, today, money };
      return {
        body: await kit.reads.answer('quote', scope, { marginShare: undefined, ...question }),
      };
    },
    {
      mayAsk: (query, caller) => {
        if (query['marginShare'] === undefined || moneyFor(caller) === 'seen') return;
        throw new Refusal('forbidden', 'Recorders quote for the margin that the branch has set.');
      },
    },
  );
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
