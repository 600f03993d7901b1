import type { Actor } from '#db/queries/audit';
import type { Person } from '#db/queries/people';
import type { Store } from '#db/store';

/** What the stories of signing in are given. */
export interface SignInTools {
  store: Store;
  passwords: {
    hash(password: string): Promise<string>;
    matches(password: string, hash: string | null): Promise<boolean>;
  };
  outbox: {
    queueReset(to: { email: string; name: string }, token: string): void;
    queueNewSignIn(personId: number, occasion: Origin & { at: string }): void;
    queuePasswordChanged(personId: number, occasion: { at: string; address: string }): void;
  };
  cookies: {
    read(header: string | undefined): ShownCookie | undefined;
    verifies(shown: ShownCookie, signIn: { id: number; startedAt: string }): boolean;
  };
  /** A new one-time token. */
  newToken: () => string;
  /** The machine's clock (rule 63). */
  clock: { now(): Date };
}

/** What a refresh cookie says, before it is believed. */
export interface ShownCookie {
  signInId: number;
  step: number;
  mac: string;
}

/** Where a request comes from, as the trail and the list of sign-ins keep it. */
export interface Origin {
  address: string;
  device: string;
}

/** A sign-in that may go on: from it the endpoint makes an access token and a cookie. */
export interface Opened {
  person: Person;
  signIn: { id: number; startedAt: string; step: number };
}

/** How long a sign-in lives without being used: as long as its cookie. */
export const SIGN_IN_LIVES_MS = 30 * 24 * 3600_000;

/** A person as the trail names them. */
export function asActor(person: { id: number; email: string }, address: string): Actor {
  return { label: person.email, personId: person.id, pushKeyId: null, address };
}

/** An instant some milliseconds after another, as it is stored. */
export function after(now: Date, milliseconds: number): string {
  return new Date(now.getTime() + milliseconds).toISOString();
}
