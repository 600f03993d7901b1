import { Strategy } from 'passport-jwt';
import { findSignedIn } from '#db/queries/sign-ins';
import type { Store } from '#db/store';
import type { Clock } from '../clock';
import { claimsOf, endOf, TOKEN_ALGORITHM } from './access-token';
import { bearerToken } from './bearer-token';
import type { PersonCaller } from './caller';
import type { SigningKeys } from './secret';

/** Recognises a person by their access token, and loads them as they are now: role and scope act at once (rule 64). */
export function makePersonTokenStrategy(store: Store, keys: SigningKeys, clock: Clock): Strategy {
  return new Strategy(
    {
      jwtFromRequest: bearerToken,
      // Its types know texts and buffers only; jsonwebtoken takes the KeyObject, and that is what makes it fast.
      secretOrKey: keys.tokens as unknown as Buffer,
      algorithms: [TOKEN_ALGORITHM],
    },
    (payload: unknown, done) => {
      const claims = claimsOf(payload);
      const person = claims && findSignedIn(store.unscoped, claims, clock.now().toISOString());
      if (!claims || !person) {
        done(null, false);
        return;
      }
      const { signInId } = claims;
      const caller: PersonCaller = {
        kind: 'person',
        ...person,
        signInId,
        tokenEndsAt: endOf(payload),
      };
      done(null, caller);
    },
  );
}
