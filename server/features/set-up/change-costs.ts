import { recordAudit, type Deed } from '#db/queries/audit';
import { putCost, type Put } from '#db/queries/set-up';
import type { Store } from '#db/store';
import type { CostBook, CostChange, NormLine } from '#shared/domain/cost-book';

/** Changes a dated cost or a norm and restates the jobs it touches; settles after the switch. */
export async function changeCosts(
  store: Store,
  change: CostChange,
  { actor, at, subject }: Deed,
): Promise<{ put: Put; restatedJobs: number }> {
  const { recorded, restatedJobs } = await store.restatement.apply(change, () => {
    const before = heldBefore(store.state.costs, change);
    const put = putCost(store.unscoped, change);
    recordAudit(store.unscoped, {
      at,
      actor,
      action: `${change.kind === 'norm' ? 'norm' : 'cost'}.set`,
      subject,
      branchId: null,
      detail: { change, before },
    });
    return put;
  });
  return { put: recorded, restatedJobs };
}

/** What held on the day of a change before it was made, whichever entry it came from; null: nothing did. */
function heldBefore(costs: CostBook, change: CostChange): number | readonly NormLine[] | null {
  switch (change.kind) {
    case 'hourlyCost':
      return costs.hourlyCost(change.code, change.from) ?? null;
    case 'product':
      return costs.productCost(change.code, change.from) ?? null;
    case 'consumable':
      return costs.consumableCost(change.code, change.from) ?? null;
    case 'fee':
      return costs.feeMicros(change.from) ?? null;
    case 'norm':
      return costs.norm(change.package, change.bodyType) ?? null;
  }
}
