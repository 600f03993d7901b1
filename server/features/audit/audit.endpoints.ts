import { checkAudit, listAudit, listAuditNames } from '#shared/contracts/audit';
import { breaksOfPeriod } from '#shared/domain/period';
import { refuseInput } from '#shared/domain/refusal';
import { realClock } from '../../clock';
import { cursorOf, placeOf } from '../../http/list-cursor';
import { mount, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { eventPlace } from './event-place';

/** The trail of what people did, read off the request thread: it may be long. */
export function mountAudit(mounting: Mounting, kit: Kit): void {
  mount(mounting, listAudit, async (call) => {
    const { limit, cursor, ...filters } = call.query;
    const { from, to } = filters;
    const problems = from !== undefined && to !== undefined ? breaksOfPeriod({ from, to }) : [];
    if (problems.length > 0) throw refuseInput(problems);
    const below = placeOf(cursor, eventPlace)?.event ?? null;
    const { items, next } = await kit.reads.answer('audit', call.scope, { filters, limit, below });
    return { body: { items, nextCursor: next === null ? null : cursorOf({ event: next }) } };
  });

  mount(mounting, listAuditNames, async (call) => ({
    body: await kit.reads.answer('auditNames', call.scope, null),
  }));

  mount(mounting, checkAudit, async (call) => ({
    body: {
      ...(await kit.reads.answer('auditCheck', call.scope, null)),
      checkedAt: realClock.now().toISOString(),
    },
  }));
}
