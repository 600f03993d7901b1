import { createHash } from 'node:crypto';
import { sql } from '../database';
import type { UnscopedDb } from '../unscoped-db';

/** Why a link to set a password was mailed. */
export type TokenPurpose = 'invitation' | 'reset';

/** Keeps a one-time token, as its hash only. */
export function insertPasswordToken(
  db: UnscopedDb,
  given: { token: string; personId: number; purpose: TokenPurpose; expiresAt: string },
): void {
  db.run(
    sql('password_tokens').insert({
      token_hash: hashOf(given.token),
      person_id: given.personId,
      purpose: given.purpose,
      expires_at: given.expiresAt,
    }),
  );
}

/** The active person whom a token, unused and not expired, lets set a password. */
export function findTokenHolder(
  db: UnscopedDb,
  token: string,
  now: string,
): { personId: number; email: string; purpose: TokenPurpose } | undefined {
  return db.first(
    sql('password_tokens')
      .join('people', 'people.id', 'password_tokens.person_id')
      .where({ token_hash: hashOf(token), 'people.active': 1 })
      .whereNull('used_at')
      .where('expires_at', '>', now)
      .select('people.email', { personId: 'person_id' }, 'purpose'),
  );
}

/** Makes every token of a person worthless. */
export function useUpTokensOf(db: UnscopedDb, personId: number, at: string): void {
  db.run(
    sql('password_tokens')
      .where({ person_id: personId })
      .whereNull('used_at')
      .update({ used_at: at }),
  );
}

/** The token has 256 random bits: a fast hash of it cannot be guessed back. */
function hashOf(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}
