import { Readable } from 'node:stream';

/** What is sent along with a mail whose end is held back. */
export interface HeldMail {
  /** Done, durably, before the last byte leaves. */
  beforeEnd: () => Promise<void>;
  /** Breaks the sending off when that fails: without its end a server takes no mail (RFC 5321, 4.1.1.4). */
  cancelling: AbortController;
}

/** A mail as nodemailer hands it to its plugins. */
interface PassingMail {
  data: object;
  message: { createReadStream(): Readable };
}

/**
 * Lets a mail out whole but for the line that ends it, which follows once `beforeEnd` is done. The text is read only when the
 * server has said that it wants it, so that nothing is noted before the server can take the mail.
 */
export function holdBackEnd(mail: PassingMail, done: () => void): void {
  const { beforeEnd, cancelling } = mail.data as HeldMail;
  const create = mail.message.createReadStream.bind(mail.message);
  mail.message.createReadStream = () =>
    Readable.from(held(create, beforeEnd)).on('error', () => cancelling.abort());
  done();
}

async function* held(create: () => Readable, beforeEnd: () => Promise<void>) {
  for await (const piece of create()) yield piece as Buffer;
  await beforeEnd();
}
