import { sql } from '../database';
import type { UnscopedDb } from '../unscoped-db';

/** Whether the data folder holds nothing yet: no person and no branch. */
export function isEmptyNetwork(db: UnscopedDb): boolean {
  return ['people', 'branches'].every(
    (table) => db.first(sql(table).select('id').limit(1)) === undefined,
  );
}

/** Whether somebody has this e-mail address (as given, in lower case). */
export function hasPerson(db: UnscopedDb, email: string): boolean {
  return db.first(sql('people').where({ email_key: email }).select('id')) !== undefined;
}
