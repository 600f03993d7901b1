import { recordAudit } from '#db/queries/audit';
import { readSchedule, writeSchedule } from '#db/queries/warranty-schedule';
import { getWarrantySchedule, putWarrantySchedule } from '#shared/contracts/warranty-reports';
import { refuseInput } from '#shared/domain/refusal';
import { actorOf } from '../../auth/caller';
import { realClock, todayIn } from '../../clock';
import { mount, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { checkPeople } from './check-people';
import { tellSchedule } from './tell-schedule';

/** When the report is issued and mailed by itself. */
export function mountSchedule(mounting: Mounting, kit: Kit): void {
  const { store } = kit;

  mount(mounting, getWarrantySchedule, ({ scope }) => ({
    body: tellSchedule(store, todayIn(scope, kit.clock)),
  }));

  mount(mounting, putWarrantySchedule, async ({ body, caller, address, scope }) => {
    const actor = actorOf(caller, address);
    const at = realClock.now().toISOString();
    await store.queue.write(() => {
      const problems = checkPeople(store, body.people);
      if (problems.length > 0) throw refuseInput(problems);
      const before = readSchedule(store.unscoped);
      writeSchedule(store.unscoped, body, { at, personId: actor.personId ?? 0 });
      recordAudit(store.unscoped, {
        at,
        actor,
        action: 'warranty-schedule.set',
        subject: '/warranty-schedule',
        branchId: null,
        detail: {
          before: before
            ? { active: before.active, dayOfMonth: before.dayOfMonth, people: before.people }
            : null,
          after: body,
        },
      });
    });
    return { body: tellSchedule(store, todayIn(scope, kit.clock)) };
  });
}
