import { listJobs } from '#shared/contracts/job-list';
import { Refusal } from '#shared/domain/refusal';
import { moneyFor } from '../../auth/caller';
import { jobListQuestion } from '../../http/job-list-question';
import { cursorOf, placeOf } from '../../http/list-cursor';
import { mount, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { jobPlace } from './job-place';

/** The list of jobs: filtered, sorted, by page. */
export function mountJobList(mounting: Mounting, kit: Kit): void {
  mount(mounting, listJobs, async (call) => {
    const { limit, cursor, sort, ...query } = call.query;
    const money = moneyFor(call.caller);
    if (money === 'unseen' && (sort === 'margin' || sort === 'difference')) {
      // The order alone, and the place in it that a cursor names, would tell what a recorder may not see (rule 24).
      throw new Refusal('forbidden', 'Sorting by money is not for recorders.');
    }
    const { scope, ...asked } = jobListQuestion(kit, call.scope, query);
    const after = placeOf(cursor, jobPlace(sort));
    const page = await kit.reads.answer('jobs', scope, { ...asked, sort, after, limit, money });
    return {
      body: {
        items: page.items,
        nextCursor: page.next && cursorOf({ sort, ...page.next }),
        jobs: page.jobs,
      },
    };
  });
}
