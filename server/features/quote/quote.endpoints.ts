import { getQuote } from '#shared/contracts/quote';
import { Refusal } from '#shared/domain/refusal';
import { moneyFor } from '../../auth/caller';
import { mount, type Mounting } from '../../http/mount';
import { quoteQuestion } from '../../http/quote-question';
import type { Kit } from '../../kit';

/** What the next car is likely to take, computed in a worker. */
export function mountQuote(mounting: Mounting, kit: Kit): void {
  mount(
    mounting,
    getQuote,
    async (call) => {
      const { scope, ...question } = quoteQuestion(
        kit,
        call.scope,
        call.query,
        moneyFor(call.caller),
      );
      return { body: await kit.reads.answer('quote', scope, question) };
    },
    {
      mayAsk: (query, caller) => {
        if (query['marginShare'] === undefined || moneyFor(caller) === 'seen') return;
        throw new Refusal('forbidden', 'Recorders quote for the margin that the branch has set.');
      },
    },
  );
}
