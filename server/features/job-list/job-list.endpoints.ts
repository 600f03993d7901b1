import { listJobs } from '#shared/contracts/jobs';
import { moneyFor } from '../../auth/caller';
import { jobListQuestion } from '../../http/job-list-question';
import { mount, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { cursorOf, placeOf } from './place-cursor';

/** The list of jobs: filtered, sorted, by page. */
export function mountJobList(mounting: Mounting, kit: Kit): void {
  mount(mounting, listJobs, async (call) => {
    const { limit, cursor, sort, ...query } = call.query;
    const { scope, ...asked } = jobListQuestion(kit, call.scope, query);
    const page = await kit.reads.answer('jobs', scope, {
      ...asked,
      sort,
      after: placeOf(cursor, sort),
      limit,
      money: moneyFor(call.caller),
    });
    return {
      body: {
        items: page.items,
        nextCursor: page.next && cursorOf(page.next, sort),
        jobs: page.jobs,
      },
    };
  });
}
