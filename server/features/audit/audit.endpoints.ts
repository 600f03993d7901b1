import { checkAudit, listAudit, listAuditNames } from '#shared/contracts/audit';
import { breaksOfPeriod } from '#shared/domain/period';
import { refuseInput } from '#shared/domain/refusal';
import { realClock } from '../../clock';
import { mount, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { cursorOf, eventOf } from './audit-cursor';

/** The trail of what people did, read off the request thread: it may be long. */
export function mountAudit(mounting: Mounting, kit: Kit): void {
  mount(mounting, listAudit, async (call) => {
    const { limit, cursor, ...filters } = call.query;
    const { from, to } = filters;
    const problems = from !== undefined && to !== undefined ? breaksOfPeriod({ from, to }) : [];
    if (problems.length > 0) throw refuseInput(problems);
    const asked = { filters, limit, below: eventOf(cursor) };
    const { items, next } = await kit.reads.answer('audit', call.scope, asked);
    return { body: { items, nextCursor: next === null ? null : cursorOf(next) } };
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
