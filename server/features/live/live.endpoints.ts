import { followLive } from '#shared/contracts/live';
import { Refusal } from '#shared/domain/refusal';
import { mount, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';

/** What changes in scope, told as it happens. */
export function mountLive(mounting: Mounting, kit: Kit): void {
  mount(mounting, followLive, ({ caller }) => {
    if (caller?.kind !== 'person') throw new Refusal('forbidden', 'Only a person has this call.');
    return { stream: (response) => kit.live.follow(caller, response) };
  });
}
