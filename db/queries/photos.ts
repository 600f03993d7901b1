import type { Knex } from 'knex';
import type { ScopedDb } from '../scoped-db';

/** A photo as the record has it; its bytes lie in the photo store. */
export interface PhotoRow {
  photo: string;
  finding: string | null;
  width: number;
  height: number;
  bytes: number;
  receivedAt: string;
  personName: string | null;
  keyLabel: string | null;
  /** Under which its bytes are kept. */
  storageKey: string;
  /** Of the bytes as they were sent: what "the same photo" is judged by. */
  sentHash: string;
}

/** Whether there is a job that photos can belong to: accepted and not void, or under way. */
export function standsJob(db: ScopedDb, branchId: number, jobRef: string): boolean {
  const key = { branch_id: branchId, job_ref: jobRef };
  const accepted = db.table('jobs').where(key).whereNull('voided_at').select('job_ref');
  if (db.first(accepted)) return true;
  return db.first(db.table('jobs_under_way').where(key).select('job_ref')) !== undefined;
}

/** The photos of a job of a branch, in the order received. */
export function listPhotos(db: ScopedDb, branchId: number, jobRef: string): PhotoRow[] {
  return db.all<PhotoRow>(
    photos(db, branchId, jobRef).orderBy(['photos.received_at', 'photos.photo_ref']),
  );
}

/** One photo of a job. */
export function findPhoto(
  db: ScopedDb,
  branchId: number,
  jobRef: string,
  photo: string,
): PhotoRow | undefined {
  return db.first<PhotoRow>(photos(db, branchId, jobRef).where('photo_ref', photo));
}

function photos(db: ScopedDb, branchId: number, jobRef: string): Knex.QueryBuilder {
  return db
    .table('photos')
    .leftJoin('people', 'people.id', 'photos.person_id')
    .leftJoin('push_keys', 'push_keys.id', 'photos.push_key_id')
    .where({ 'photos.branch_id': branchId, job_ref: jobRef })
    .select({
      photo: 'photo_ref',
      finding: 'finding_ref',
      width: 'width',
      height: 'height',
      bytes: 'bytes',
      receivedAt: 'received_at',
      personName: 'people.name',
      keyLabel: 'push_keys.label',
      storageKey: 'storage_key',
      sentHash: 'sent_hash',
    });
}
