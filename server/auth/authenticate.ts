import type { Request, Response } from 'express';
import { Passport } from 'passport';
import { Refusal } from '#shared/domain/refusal';
import { realClock, type Clock } from '../clock';
import type { Kit } from '../kit';
import type { Authenticate, Caller } from './caller';
import { makePersonTokenStrategy } from './person-token-strategy';
import { makePushKeyStrategy } from './push-key-strategy';
import { readSecret } from './secret';

const STRATEGIES = ['push-key', 'jwt'];

/** Makes what finds out who calls: a push key's branch or a person with an access token, else a refusal that becomes 401. */
export function makeAuthenticate(
  kit: Pick<Kit, 'store' | 'config'>,
  clock: Clock = realClock,
): Authenticate {
  const passport = new Passport();
  passport.use(makePushKeyStrategy(kit.store, clock));
  passport.use(makePersonTokenStrategy(kit.store, readSecret(kit.config), clock));
  return (request: Request) =>
    new Promise<Caller>((resolve, reject) => {
      const settle = (error: unknown, caller?: unknown) => {
        if (error) reject(error instanceof Error ? error : new Error('no way to tell who calls'));
        else if (caller) resolve(caller as Caller);
        else
          reject(new Refusal('unauthenticated', 'Sign in first: this call needs a valid token.'));
      };
      const ask = passport.authenticate(STRATEGIES, { session: false }, settle) as (
        request: Request,
        response: Response | undefined,
        next: (error: unknown) => void,
      ) => void;
      // With a callback passport leaves the response alone, so none is handed over.
      ask(request, undefined, settle);
    });
}
