import { readUnsubscription, unsubscribe } from '#shared/contracts/unsubscribe';
import { readSecret } from '../../auth/secret';
import { readUnsubscribeToken } from '../../auth/unsubscribe-token';
import { realClock } from '../../clock';
import { mount, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { readStanding, stopMail } from './stop-mail';

/**
 * The link that stops a kind of mail: read by anybody who holds it, and done by posting to it. A mail program posts to the very
 * address of the page (RFC 8058), whose GET stays the page for people.
 */
export function mountUnsubscribe(mounting: Mounting, { store, config }: Kit): void {
  const key = readSecret(config).mails;

  mounting.router.post('/unsubscribe', (request, _response, next) => {
    request.url = request.url.replace('/unsubscribe', unsubscribe.path);
    next();
  });

  mount(mounting, readUnsubscription, ({ query }) => ({
    body: readStanding(store, readUnsubscribeToken(key, query.token)),
  }));

  mount(mounting, unsubscribe, async ({ query, address }) => ({
    body: await stopMail(store, readUnsubscribeToken(key, query.token), {
      at: realClock.now().toISOString(),
      address,
    }),
  }));
}
