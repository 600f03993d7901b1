import { mount, type Mounting } from '#server/http/mount';
import type { Kit } from '#server/kit';
import { keptMails } from '#db/queries/mails';
import { listMailbox } from '#shared/contracts/system';
import { notFound } from '#shared/domain/refusal';

/** Older mails are of no use: their links have expired. */
const NEWEST = 200;

/** Mounts the local mailbox, which exists only while no SMTP server is configured. */
export function mountMailbox(mounting: Mounting, kit: Kit): void {
  mount(mounting, listMailbox, () => {
    if (kit.config.smtpUrl !== undefined) throw notFound();
    return { body: { items: keptMails(kit.store.unscoped, NEWEST) } };
  });
}
