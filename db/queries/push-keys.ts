import { createHash, timingSafeEqual } from 'node:crypto';
import { sql } from '../database';
import type { UnscopedDb } from '../unscoped-db';

/** A push key as head office sees it; the secret itself is nowhere. */
export interface PushKey {
  id: string;
  label: string;
  createdAt: string;
  lastUsedAt: string | null;
  revokedAt: string | null;
}

/** Keeps a new key of a branch, its secret as a hash only. */
export function insertPushKey(
  db: UnscopedDb,
  key: {
    id: string;
    secret: string;
    branchId: number;
    label: string;
    createdAt: string;
    createdBy: number | null;
  },
): void {
  db.run(
    sql('push_keys').insert({
      id: key.id,
      branch_id: key.branchId,
      label: key.label,
      secret_hash: hashOf(key.secret).toString('hex'),
      created_at: key.createdAt,
      created_by: key.createdBy,
    }),
  );
}

/** All keys of a branch, newest first, revoked ones too. */
export function listPushKeys(db: UnscopedDb, branchId: number): PushKey[] {
  return db.all<PushKey>(
    sql('push_keys')
      .where({ branch_id: branchId })
      .orderBy([{ column: 'created_at', order: 'desc' }, 'id'])
      .select('id', 'label', {
        createdAt: 'created_at',
        lastUsedAt: 'last_used_at',
        revokedAt: 'revoked_at',
      }),
  );
}

/** The key that id and secret belong to, unless it is revoked. Unknown ids are compared too, so that time tells nothing. */
export function matchPushKey(
  db: UnscopedDb,
  shown: { id: string; secret: string },
): { id: string; label: string; branchId: number } | undefined {
  const row = db
    .prepare(
      `select id, label, branch_id as branchId, secret_hash as hash from push_keys
       where id = ? and revoked_at is null`,
    )
    .get(shown.id) as { id: string; label: string; branchId: number; hash: string } | undefined;
  const same = timingSafeEqual(hashOf(shown.secret), Buffer.from(row?.hash ?? NO_HASH, 'hex'));
  return row && same ? { id: row.id, label: row.label, branchId: row.branchId } : undefined;
}

/** Revokes a key of a branch; false when there is none that still works. */
export function revokePushKey(db: UnscopedDb, branchId: number, id: string, at: string): boolean {
  const { changes } = db.run(
    sql('push_keys')
      .where({ id, branch_id: branchId })
      .whereNull('revoked_at')
      .update({ revoked_at: at }),
  );
  return changes > 0;
}

export function stampPushKey(db: UnscopedDb, id: string, at: string): void {
  db.prepare('update push_keys set last_used_at = ? where id = ?').run(at, id);
}

const NO_HASH = '0'.repeat(64);

/** The secret has 256 random bits: a fast hash of it cannot be guessed back. */
function hashOf(secret: string): Buffer {
  return createHash('sha256').update(secret).digest();
}
