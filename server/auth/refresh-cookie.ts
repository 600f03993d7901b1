import { createHmac, timingSafeEqual, type KeyObject } from 'node:crypto';
import type { Config } from '../config';

/** How long a refresh cookie is good for after it was issued. */
export const REFRESH_SECONDS = 30 * 24 * 3600;

const NAME = 'underseam_refresh';

/** What a refresh cookie says; believed only once its keyed hash is checked. */
export interface ShownCookie {
  signInId: number;
  step: number;
  mac: string;
}

/** The sign-in a cookie stands for, and which of its cookies it is. */
interface Stamp {
  id: number;
  startedAt: string;
  step: number;
}

/** Issues and reads refresh cookies, `<sign-in>.<step>.<HMAC-SHA256>`. */
export class RefreshCookies {
  private readonly attributes: string;

  constructor(
    private readonly key: KeyObject,
    config: Pick<Config, 'publicUrl'>,
  ) {
    // On plain http (a demo on this machine) a browser would not keep a Secure cookie.
    const secure = config.publicUrl.startsWith('https:') ? '; Secure' : '';
    this.attributes = `; Path=/api/auth; HttpOnly; SameSite=Strict${secure}`;
  }

  /** The `Set-Cookie` header for one step of a sign-in. */
  issue(stamp: Stamp): string {
    const value = `${stamp.id}.${stamp.step}.${this.macOf(stamp).toString('hex')}`;
    return `${NAME}=${value}; Max-Age=${REFRESH_SECONDS}${this.attributes}`;
  }

  /** The `Set-Cookie` header that removes the cookie. */
  clear(): string {
    return `${NAME}=; Max-Age=0${this.attributes}`;
  }

  /** Finds the cookie in a `Cookie` header (RFC 6265); its value is made of digits and dots, so nothing needs decoding. */
  read(header: string | undefined): ShownCookie | undefined {
    for (const pair of (header ?? '').split(';')) {
      const shown = /^underseam_refresh=(\d{1,15})\.(\d{1,15})\.([0-9a-f]{64})$/.exec(pair.trim());
      if (shown) return { signInId: Number(shown[1]), step: Number(shown[2]), mac: shown[3]! };
    }
    return undefined;
  }

  /** Whether a shown cookie was issued here for this sign-in. */
  verifies(shown: ShownCookie, signIn: { id: number; startedAt: string }): boolean {
    const { id, startedAt } = signIn;
    const expected = this.macOf({ id, startedAt, step: shown.step });
    return shown.signInId === id && timingSafeEqual(Buffer.from(shown.mac, 'hex'), expected);
  }

  /** The start is hashed too: after a restored backup the same id may be given to another person's sign-in. */
  private macOf({ id, step, startedAt }: Stamp): Buffer {
    return createHmac('sha256', this.key).update(`${id}:${step}:${startedAt}`).digest();
  }
}
