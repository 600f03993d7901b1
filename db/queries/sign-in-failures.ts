import { createHash } from 'node:crypto';
import { sql } from '../database';
import type { UnscopedDb } from '../unscoped-db';

/** Attempts counted under one name since `firstAt`. */
export interface Attempts {
  failures: number;
  firstAt: string;
  lockedUntil: string | null;
}

/** What was counted under a name, or `undefined`. */
export function findAttempts(db: UnscopedDb, name: string): Attempts | undefined {
  return db.first<Attempts>(
    sql('sign_in_failures')
      .where({ email_key: keyOf(name) })
      .select('failures', { firstAt: 'first_at', lockedUntil: 'locked_until' }),
  );
}

export function keepAttempts(db: UnscopedDb, name: string, attempts: Attempts): void {
  const row = {
    failures: attempts.failures,
    first_at: attempts.firstAt,
    locked_until: attempts.lockedUntil,
  };
  db.run(
    sql('sign_in_failures')
      .insert({ email_key: keyOf(name), ...row })
      .onConflict('email_key')
      .merge(row),
  );
}

export function clearAttempts(db: UnscopedDb, name: string): void {
  db.run(
    sql('sign_in_failures')
      .where({ email_key: keyOf(name) })
      .delete(),
  );
}

/** Forgets what was counted from before an instant and locks nothing any more. */
export function forgetAttempts(db: UnscopedDb, before: string, now: string): void {
  db.run(
    sql('sign_in_failures')
      .where('first_at', '<', before)
      .where((row) => void row.whereNull('locked_until').orWhere('locked_until', '<=', now))
      .delete(),
  );
}

/** Kept as a hash: what is typed into an address field may be anything, a password too. */
function keyOf(name: string): string {
  return createHash('sha256').update(name).digest('hex');
}
