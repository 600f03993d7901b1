import { getRot } from '#shared/contracts/rot';
import { mount, type Mounting } from '../../http/mount';
import { scopeQuestion } from '../../http/scope-question';
import type { Kit } from '../../kit';

/** Rot found, computed in a worker. */
export function mountRot(mounting: Mounting, kit: Kit): void {
  mount(mounting, getRot, async (call) => {
    const { scope, period, filters } = scopeQuestion(kit, call.scope, call.query);
    return { body: await kit.reads.answer('rot', scope, { period, filters }) };
  });
}
