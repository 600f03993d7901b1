import { getWarranty, MOST_CURVES } from '#shared/contracts/warranty';
import { mount, type Mounting } from '../../http/mount';
import { breaksOfGroups, coverQuestion } from '../../http/warranty-question';
import type { Kit } from '../../kit';

/** Warranty risk, computed in a worker. */
export function mountWarranty(mounting: Mounting, kit: Kit): void {
  mount(mounting, getWarranty, async (call) => {
    const { groupBy, group: groups, ...query } = call.query;
    const problems = breaksOfGroups(groups, MOST_CURVES);
    const { scope, ...asked } = coverQuestion(kit, call.scope, query, problems);
    return { body: await kit.reads.answer('warranty', scope, { ...asked, groupBy, groups }) };
  });
}
