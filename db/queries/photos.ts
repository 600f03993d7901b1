import type { Knex } from 'knex';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import { standsClaim } from './claims';

/** What a photo belongs to: a job or a claim of a branch, by its reference. */
export interface PhotoPlace {
  of: 'job' | 'claim';
  ref: string;
}

/** A photo as the record has it; its bytes lie in the photo store. */
export interface PhotoRow {
  photo: string;
  /** Of a job's photo: the finding it shows. */
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

/** Where the photos of each place are kept, and in which column the reference of the place stands. */
export const PHOTO_TABLES = {
  job: { table: 'photos', ref: 'job_ref' },
  claim: { table: 'claim_photos', ref: 'claim_ref' },
} as const;

/** Whether there is something that photos can belong to: a job accepted and not void, or under way; a claim on a job not void. */
export function standsPlace(db: ScopedDb, branchId: number, { of, ref }: PhotoPlace): boolean {
  if (of === 'claim') return standsClaim(db, branchId, ref);
  const key = { branch_id: branchId, job_ref: ref };
  const accepted = db.table('jobs').where(key).whereNull('voided_at').select('job_ref');
  if (db.first(accepted)) return true;
  return db.first(db.table('jobs_under_way').where(key).select('job_ref')) !== undefined;
}

/** The photos of a place of a branch, in the order received. */
export function listPhotos(db: ScopedDb, branchId: number, place: PhotoPlace): PhotoRow[] {
  return db.all<PhotoRow>(photos(db, branchId, place).orderBy(['p.received_at', 'p.photo_ref']));
}

/** One photo of a place. */
export function findPhoto(
  db: ScopedDb,
  branchId: number,
  place: PhotoPlace,
  photo: string,
): PhotoRow | undefined {
  return db.first<PhotoRow>(photos(db, branchId, place).where('p.photo_ref', photo));
}

function photos(db: ScopedDb, branchId: number, { of, ref }: PhotoPlace): Knex.QueryBuilder {
  const kept = PHOTO_TABLES[of];
  return db
    .table(kept.table, 'p')
    .leftJoin('people', 'people.id', 'p.person_id')
    .leftJoin('push_keys', 'push_keys.id', 'p.push_key_id')
    .where({ 'p.branch_id': branchId, [`p.${kept.ref}`]: ref })
    .select({
      photo: 'p.photo_ref',
      finding: of === 'job' ? 'p.finding_ref' : sql.raw('null'),
      width: 'p.width',
      height: 'p.height',
      bytes: 'p.bytes',
      receivedAt: 'p.received_at',
      personName: 'people.name',
      keyLabel: 'push_keys.label',
      storageKey: 'p.storage_key',
      sentHash: 'p.sent_hash',
    });
}
