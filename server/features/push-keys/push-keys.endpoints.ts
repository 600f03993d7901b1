import { actorOf, type Caller } from '#server/auth/caller';
import { pushKeyText } from '#server/auth/push-key-strategy';
import { randomKeyId, randomSecret } from '#server/auth/random-secret';
import { realClock, type Clock } from '#server/clock';
import { mount, type Mounting } from '#server/http/mount';
import type { Kit } from '#server/kit';
import { listPushKeys } from '#db/queries/push-keys';
import * as contracts from '#shared/contracts/push-keys';
import { addKey } from './add-key';
import { revokeKey } from './revoke-key';

/** Mounts the push keys of a branch. */
export function mountPushKeys(mounting: Mounting, kit: Kit, clock: Clock = realClock): void {
  const { store } = kit;
  const deed = ({ caller, address }: { caller: Caller | undefined; address: string }) => ({
    actor: actorOf(caller, address),
    at: clock.now().toISOString(),
  });

  mount(mounting, contracts.addKey, async (call) => {
    const key = { id: randomKeyId(), label: call.body.label, secret: randomSecret() };
    await addKey(store, key, call.branch!, deed(call));
    return { body: { id: key.id, label: key.label, key: pushKeyText(key.id, key.secret) } };
  });
  mount(mounting, contracts.listKeys, ({ branch }) => ({
    body: { items: listPushKeys(store.unscoped, branch!.id) },
  }));
  mount(mounting, contracts.revokeKey, async (call) => {
    await revokeKey(store, call.params.id, call.branch!, deed(call));
    return {};
  });
}
