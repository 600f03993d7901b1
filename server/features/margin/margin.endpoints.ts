import { getMargin } from '#shared/contracts/margin';
import { mount, type Mounting } from '../../http/mount';
import { scopeQuestion } from '../../http/scope-question';
import type { Kit } from '../../kit';

/** Weekly margin, computed in a worker. */
export function mountMargin(mounting: Mounting, kit: Kit): void {
  mount(mounting, getMargin, async (call) => {
    const { scope, ...question } = scopeQuestion(kit, call.scope, call.query);
    return { body: await kit.reads.answer('margin', scope, question) };
  });
}
