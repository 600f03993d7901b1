import { recordAudit, type Deed } from '#db/queries/audit';
import { putCost, type Put } from '#db/queries/set-up';
import type { Store } from '#db/store';
import type { CostChange } from '#shared/domain/cost-book';

/** Changes a dated cost or a norm and restates the jobs it touches; settles after the switch. */
export async function changeCosts(
  store: Store,
  change: CostChange,
  { actor, at, subject }: Deed,
): Promise<{ put: Put; restatedJobs: number }> {
  const { recorded, restatedJobs } = await store.restatement.apply(change, () => {
    const put = putCost(store.unscoped, change);
    recordAudit(store.unscoped, {
      at,
      actor,
      action: `${change.kind === 'norm' ? 'norm' : 'cost'}.set`,
      subject,
      branchId: null,
      detail: { change },
    });
    return put;
  });
  return { put: recorded, restatedJobs };
}
