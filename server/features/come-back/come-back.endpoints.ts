import { ComeBackWriter } from '#db/come-back-writer';
import { findLeft, listMarks } from '#db/queries/come-back-of-job';
import { tellComeBack, type ComeBackRow } from '#db/queries/come-back-row';
import { getComeBack, listComeBack, putComeBack } from '#shared/contracts/come-back';
import { localDate } from '#shared/domain/calendar';
import { breaksOfMark } from '#shared/domain/come-back-rules';
import { notFound } from '#shared/domain/refusal';
import { actorOf } from '../../auth/caller';
import { realClock } from '../../clock';
import { comeBackQuestion } from '../../http/come-back-question';
import { cursorOf, placeOf } from '../../http/list-cursor';
import { mount, namedBranch, type Call, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { leftPlace } from './left-place';
import { markComeBack } from './mark-come-back';

/** Rot left on cars and the marks people set on it. */
export function mountComeBack(mounting: Mounting, kit: Kit): void {
  const { store } = kit;
  const found = ({ scope, branch, params }: Named): ComeBackRow | undefined =>
    branch && params && findLeft(store.scoped(scope), branch.code, params.jobRef, params.ref);

  mount(mounting, listComeBack, async (call) => {
    const { limit, cursor, ...query } = call.query;
    const { scope, ...asked } = comeBackQuestion(kit, call.scope, query);
    const after = placeOf(cursor, leftPlace);
    const { next, ...page } = await kit.reads.answer('comeBack', scope, { ...asked, limit, after });
    return { body: { ...page, nextCursor: next && cursorOf(next) } };
  });

  mount(mounting, getComeBack, (call) => {
    const row = found(call);
    if (!row) throw notFound();
    const changes = listMarks(store.scoped(call.scope), row.job_id, row.ref);
    return { body: { ...tellComeBack(row), changes } };
  });

  mount(
    mounting,
    putComeBack,
    async (call) => {
      const { caller } = call;
      if (caller?.kind !== 'person') throw notFound();
      const marking = {
        actor: { ...actorOf(caller, call.address), personId: caller.id },
        at: realClock.now().toISOString(),
        role: caller.role,
      };
      const writer = new ComeBackWriter(store, namedBranch(call));
      const { jobRef, ref } = call.params;
      return {
        body: await store.queue.write(() => markComeBack(writer, jobRef, ref, call.body, marking)),
      };
    },
    {
      exists: (named) => found(named) !== undefined,
      rules: (raw, named) => {
        const row = found(named);
        if (!row || !named.branch) return [];
        const today = localDate(kit.clock.now(), named.branch.timeZone);
        return breaksOfMark(raw, row.completed_on, today);
      },
    },
  );
}

type Named = Pick<Call, 'scope' | 'branch'> & {
  params: { jobRef: string; ref: string } | undefined;
};
