import { recordAudit, type Actor } from '#db/queries/audit';
import { insertPushKey } from '#db/queries/push-keys';
import type { Store } from '#db/store';

/** A push key just made: the only time its text is known. */
export interface NewKey {
  id: string;
  label: string;
  secret: string;
}

/** Makes a push key for one branch. */
export async function addKey(
  store: Store,
  key: NewKey,
  branch: { id: number; code: string },
  by: { actor: Actor; at: string },
): Promise<void> {
  const db = store.unscoped;
  await store.queue.write(() => {
    insertPushKey(db, {
      ...key,
      branchId: branch.id,
      createdAt: by.at,
      createdBy: by.actor.personId,
    });
    recordAudit(db, {
      ...by,
      action: 'key.add',
      subject: `/branches/${branch.code}/keys/${key.id}`,
      branchId: branch.id,
      detail: { label: key.label },
    });
  });
}
