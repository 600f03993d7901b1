import { getOverrun } from '#shared/contracts/overrun';
import { mount, type Mounting } from '../../http/mount';
import { scopeQuestion } from '../../http/scope-question';
import type { Kit } from '../../kit';

/** Labour overrun, computed in a worker. */
export function mountOverrun(mounting: Mounting, kit: Kit): void {
  mount(mounting, getOverrun, async (call) => {
    const { by, ...query } = call.query;
    const { scope, period, filters } = scopeQuestion(kit, call.scope, query);
    return { body: await kit.reads.answer('overrun', scope, { period, filters, by }) };
  });
}
