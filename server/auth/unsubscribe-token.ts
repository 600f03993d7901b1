import type { KeyObject } from 'node:crypto';
import jwt from 'jsonwebtoken';
import { MAIL_KINDS, type MailKind } from '#shared/domain/mail-kinds';
import { TOKEN_ALGORITHM } from './access-token';

/** What the link in a mail says: whose mail of which kind it stops. */
export interface Unsubscribing {
  personId: number;
  kind: MailKind;
}

/** No access token can stand for one of these, nor one of these for it. */
const AUDIENCE = 'underseam mail choices';

/**
 * Makes the token of the link that stops a kind of mail (RFC 7519). It never expires: a mail is read whenever it is read, and a
 * link that has gone stale leaves the reader only the spam button. All it can do is stop one kind of mail for one person, which
 * they can take back on their own page. The same person and kind always give the same token.
 */
export function issueUnsubscribeToken(key: KeyObject, { personId, kind }: Unsubscribing): string {
  return jwt.sign({ kind }, key, {
    subject: String(personId),
    audience: AUDIENCE,
    algorithm: TOKEN_ALGORITHM,
    noTimestamp: true,
  });
}

/** Reads such a token, or `undefined` when we did not sign it for this. */
export function readUnsubscribeToken(key: KeyObject, token: string): Unsubscribing | undefined {
  let payload: unknown;
  try {
    payload = jwt.verify(token, key, { algorithms: [TOKEN_ALGORITHM], audience: AUDIENCE });
  } catch {
    // Whatever is wrong with it, the answer is the same.
    return undefined;
  }
  const { sub, kind } = payload as { sub?: unknown; kind?: unknown };
  const personId = typeof sub === 'string' ? Number(sub) : Number.NaN;
  const known = MAIL_KINDS.find((one) => one === kind);
  return Number.isSafeInteger(personId) && known ? { personId, kind: known } : undefined;
}
