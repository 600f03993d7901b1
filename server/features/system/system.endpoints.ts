import { readNetwork } from '#db/queries/network';
import { getHealth } from '#shared/contracts/system';
import { mount, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';

/** Whether the service and its database answer. */
export function mountSystem(mounting: Mounting, kit: Kit): void {
  mount(mounting, getHealth, () => {
    // A real read: a database that is gone makes this a fault, not a polite lie.
    readNetwork(kit.store.unscoped);
    return { body: { status: 'ok', version: kit.version, database: 'ok' } as const };
  });
}
