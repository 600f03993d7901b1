import { recordAudit, type Actor } from '#db/queries/audit';
import { revokePushKey } from '#db/queries/push-keys';
import type { Store } from '#db/store';
import { notFound } from '#shared/domain/refusal';

/** Revokes a push key of a branch: the next request with it is refused. */
export async function revokeKey(
  store: Store,
  id: string,
  branch: { id: number; code: string },
  by: { actor: Actor; at: string },
): Promise<void> {
  const db = store.unscoped;
  await store.queue.write(() => {
    if (!revokePushKey(db, branch.id, id, by.at)) throw notFound();
    recordAudit(db, {
      ...by,
      action: 'key.revoke',
      subject: `/branches/${branch.code}/keys/${id}`,
      branchId: branch.id,
      detail: {},
    });
  });
}
