import { getClaimHistory, listClaims as contract } from '#shared/contracts/claim-list';
import { Refusal } from '#shared/domain/refusal';
import { moneyFor } from '../../auth/caller';
import { claimListQuestion } from '../../http/claim-list-question';
import { cursorOf, placeOf } from '../../http/list-cursor';
import { mount, namedBranch, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { claimPlace } from './claim-place';
import { tellClaimHistory } from './tell-claim-history';

/** Lists of claims and how each came about. */
export function mountClaimList(mounting: Mounting, kit: Kit): void {
  mount(mounting, contract, async (call) => {
    const { limit, cursor, sort, ...query } = call.query;
    const money = moneyFor(call.caller);
    if (money === 'unseen' && sort === 'cost') {
      // The order alone, and the place in it that a cursor names, would tell what a recorder may not see (rule 24).
      throw new Refusal('forbidden', 'Sorting by money is not for recorders.');
    }
    const { scope, ...asked } = claimListQuestion(kit, call.scope, query);
    const after = placeOf(cursor, claimPlace(sort));
    const question = { ...asked, sort, after, limit, money };
    const { next, ...page } = await kit.reads.answer('claims', scope, question);
    return { body: { ...page, nextCursor: next && cursorOf({ sort, ...next }) } };
  });

  mount(mounting, getClaimHistory, (call) => {
    const db = kit.store.scoped(call.scope);
    const { claimRef } = call.params;
    const history = tellClaimHistory(db, namedBranch(call).code, claimRef, moneyFor(call.caller));
    return { body: history };
  });
}
