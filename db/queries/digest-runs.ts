import { sql } from '../database';
import type { UnscopedDb } from '../unscoped-db';

/** Kinds of mail that go out by themselves, period by period. */
export type DigestKind = 'monday_digest' | 'region_digest' | 'month_digest';

/** Whether the digests of a kind and period have been made, whether or not they had anything to say. */
export function hasDigestRun(db: UnscopedDb, kind: DigestKind, period: string): boolean {
  return db.first(sql('digest_runs').where({ kind, period }).select('at')) !== undefined;
}

/** Notes that they have; a second run of the same kind and period breaks the write it is in. */
export function insertDigestRun(
  db: UnscopedDb,
  run: { kind: DigestKind; period: string; at: string; mails: number },
): void {
  db.run(sql('digest_runs').insert(run));
}

/** Whether the look at signals of a day has been written. */
export function hasSignalLook(db: UnscopedDb, day: string): boolean {
  return db.first(sql('signal_looks').where({ day }).select('at')) !== undefined;
}

/** The day of the newest look at signals that the last digests of a kind told of; nothing before the first. */
export function lastLookTold(db: UnscopedDb, kind: DigestKind): string | undefined {
  const row = db.first<{ day: string | null }>(
    sql('signal_looks')
      .where('at', '<=', sql('digest_runs').where({ kind }).max('at'))
      .max({ day: 'day' }),
  );
  return row?.day ?? undefined;
}
