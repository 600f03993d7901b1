import { getUsual } from '#shared/contracts/usual';
import { mount, namedBranch, type Mounting } from '../../http/mount';
import { quoteQuestion } from '../../http/quote-question';
import type { Kit } from '../../kit';

/** What such a car usually takes, for whoever writes one down; computed in a worker. */
export function mountUsual(mounting: Mounting, kit: Kit): void {
  mount(mounting, getUsual, async (call) => {
    const branch = namedBranch(call).code;
    const { scope, ...asked } = quoteQuestion(kit, call.scope, { ...call.query, branch }, 'unseen');
    return { body: await kit.reads.answer('usual', scope, asked) };
  });
}
