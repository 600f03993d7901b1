import type { Request } from 'express';
import type { Actor } from '#db/queries/audit';
import type { Role } from '#shared/domain/vocabulary';

/** A person with a valid access token, as the database has them at this moment (rule 64). */
export interface PersonCaller {
  kind: 'person';
  id: number;
  email: string;
  name: string;
  role: Role;
  branchIds: readonly number[];
  regionCodes: readonly string[];
  signInId: number;
  /** When the access token is over, for what lasts longer than a request. */
  tokenEndsAt: Date;
}

/** A branch's own system with a push key. */
export interface KeyCaller {
  kind: 'key';
  id: string;
  label: string;
  branchId: number;
}

export type Caller = PersonCaller | KeyCaller;

/** Finds out who calls: throws a `Refusal` of kind `unauthenticated` for no or no valid token. */
export type Authenticate = (request: Request) => Promise<Caller> | Caller;

/** The caller as the audit trail names them. */
export function actorOf(caller: Caller | undefined, address: string): Actor {
  if (!caller) return { label: 'nobody signed in', personId: null, pushKeyId: null, address };
  return caller.kind === 'person'
    ? { label: caller.email, personId: caller.id, pushKeyId: null, address }
    : { label: `key ${caller.id}`, personId: null, pushKeyId: caller.id, address };
}

/** The person who calls, by number, for what is told to others but not to them. */
export function personIdOf(caller: Caller | undefined): number | undefined {
  return caller?.kind === 'person' ? caller.id : undefined;
}

/** A recorder sees no money (rule 24); a push key sends all of it. */
export function moneyFor(caller: Caller | undefined): 'seen' | 'unseen' {
  return caller?.kind === 'person' && caller.role === 'recorder' ? 'unseen' : 'seen';
}
