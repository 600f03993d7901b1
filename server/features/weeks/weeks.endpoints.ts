import { recordAudit } from '#db/queries/audit';
import { findWeekNote, listWeekNotes, putWeekNoteRow } from '#db/queries/week-notes';
import { listWeekNotes as listContract, putWeekNote } from '#shared/contracts/weeks';
import { isoWeek } from '#shared/domain/calendar';
import { breaksOfPeriod } from '#shared/domain/period';
import { notFound, refuseInput } from '#shared/domain/refusal';
import { actorOf } from '../../auth/caller';
import { realClock } from '../../clock';
import { mount, namedBranch, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';

/** What managers write about their weeks. */
export function mountWeeks(mounting: Mounting, kit: Kit): void {
  const { store } = kit;

  mount(mounting, putWeekNote, async (call) => {
    const branch = namedBranch(call);
    const { caller } = call;
    if (caller?.kind !== 'person') throw notFound();
    const { week } = call.params;
    const text = call.body.text.normalize('NFC').trim();
    const changedAt = realClock.now().toISOString();
    await store.queue.write(() => {
      const before = findWeekNote(store.unscoped, branch, week);
      putWeekNoteRow(store.unscoped, branch, { week, text, personId: caller.id, changedAt });
      recordAudit(store.unscoped, {
        at: changedAt,
        actor: actorOf(caller, call.address),
        action: 'week.note',
        subject: `/branches/${branch.code}/weeks/${week}/note`,
        branchId: branch.id,
        detail: { before, after: text },
      });
    });
    const note = { branch: branch.code, week, text, by: caller.name, changedAt };
    return { body: { note: text === '' ? null : note } };
  });

  mount(mounting, listContract, (call) => {
    const { from, to } = call.query;
    const problems = breaksOfPeriod({ from, to });
    if (problems.length > 0) throw refuseInput(problems);
    const reader = store.scoped(call.scope.narrow(call.query));
    return { body: { items: listWeekNotes(reader, isoWeek(from), isoWeek(to)) } };
  });
}
