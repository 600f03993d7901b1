import { recordAudit, type Deed } from '#db/queries/audit';
import type { Put } from '#db/queries/set-up';
import type { Store } from '#db/store';

/** Writes one row of the catalogue with its audit entry and refreshes what is kept in memory. */
export async function changeCatalogue(
  store: Store,
  action: string,
  write: () => { put: Put; before: unknown; after: unknown },
  { actor, at, subject }: Deed,
): Promise<Put> {
  return store.queue.write(() => {
    const { put, before, after } = write();
    recordAudit(store.unscoped, {
      at,
      actor,
      action,
      subject,
      branchId: null,
      detail: { before, after },
    });
    store.state.reload();
    return put;
  });
}
