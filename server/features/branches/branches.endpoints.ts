import { getBranches, getBranchWeeks, getSideBySide } from '#shared/contracts/branches';
import { mount, type Mounting } from '../../http/mount';
import { scopeQuestion } from '../../http/scope-question';
import type { Kit } from '../../kit';

/** Branches compared, computed in a worker. */
export function mountBranches(mounting: Mounting, kit: Kit): void {
  mount(mounting, getBranches, async (call) => {
    const { measure, ...query } = call.query;
    const { scope, ...asked } = scopeQuestion(kit, call.scope, query);
    return { body: await kit.reads.answer('branches', scope, { ...asked, measure }) };
  });

  mount(mounting, getBranchWeeks, async (call) => {
    const { measure, ...query } = call.query;
    const { scope, ...asked } = scopeQuestion(kit, call.scope, query);
    return { body: await kit.reads.answer('branchWeeks', scope, { ...asked, measure }) };
  });

  mount(mounting, getSideBySide, async (call) => {
    const { measure, ...query } = call.query;
    const { scope, ...asked } = scopeQuestion(kit, call.scope, query);
    return { body: await kit.reads.answer('sideBySide', scope, { ...asked, measure }) };
  });
}
