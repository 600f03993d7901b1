import type { Knex } from 'knex';
import { sql, type Connection } from './database';
import { recordAudit, type Deed } from './queries/audit';
import { findPhoto, listPhotos, standsJob, type PhotoRow } from './queries/photos';
import type { ScopedBranch } from './scope';
import type { ScopedDb } from './scoped-db';
import type { Store } from './store';
import { UnscopedDb } from './unscoped-db';
import { writingReader } from './writing-reader';

/** What is kept of a photo beside its bytes. */
export type KeptPhoto = Pick<
  PhotoRow,
  'finding' | 'storageKey' | 'sentHash' | 'width' | 'height' | 'bytes'
>;

/**
 * Writes what the record has of one branch's photos. Bound to its branch for life; every method runs inside
 * `WriteQueue.write`. Photos received are not copied into the trail, their rows say who and when; a photo that is replaced or
 * removed leaves no row, so the trail tells of it.
 */
export class PhotoWriter {
  private readonly connection: Connection;
  private readonly reader: ScopedDb;

  constructor(
    store: Store,
    readonly branch: ScopedBranch,
  ) {
    this.connection = store.writing;
    this.reader = writingReader(store, branch);
  }

  /** Whether there is a job that photos can belong to at this moment. */
  standsJob(jobRef: string): boolean {
    return standsJob(this.reader, this.branch.id, jobRef);
  }

  /** How many photos a job has. */
  count(jobRef: string): number {
    return listPhotos(this.reader, this.branch.id, jobRef).length;
  }

  /** A photo as it stands at this moment. */
  find(jobRef: string, photo: string): PhotoRow | undefined {
    return findPhoto(this.reader, this.branch.id, jobRef, photo);
  }

  /** Adds a photo that was not there. */
  add(jobRef: string, photo: string, kept: KeptPhoto, { actor, at }: Deed): void {
    const sender = { received_at: at, person_id: actor.personId, push_key_id: actor.pushKeyId };
    const key = { branch_id: this.branch.id, job_ref: jobRef, photo_ref: photo };
    this.connection.run(sql('photos').insert({ ...key, ...columnsOf(kept), ...sender }));
  }

  /** Puts another photo, or another finding, in the place of one; who sent it last is its sender. */
  replace(jobRef: string, former: PhotoRow, kept: KeptPhoto, deed: Deed): void {
    const { actor, at } = deed;
    const sender = { received_at: at, person_id: actor.personId, push_key_id: actor.pushKeyId };
    const row = this.row(jobRef, former.photo);
    this.connection.run(row.update({ ...columnsOf(kept), ...sender }));
    this.tell('photo.replace', former, deed);
  }

  /** Takes a photo out of the record. */
  remove(jobRef: string, former: PhotoRow, deed: Deed): void {
    this.connection.run(this.row(jobRef, former.photo).delete());
    this.tell('photo.remove', former, deed);
  }

  private row(jobRef: string, photo: string): Knex.QueryBuilder {
    return sql('photos').where({ branch_id: this.branch.id, job_ref: jobRef, photo_ref: photo });
  }

  private tell(action: string, former: PhotoRow, { actor, at, subject }: Deed): void {
    const { finding, sentHash, receivedAt } = former;
    recordAudit(new UnscopedDb(this.connection), {
      at,
      actor,
      action,
      subject,
      branchId: this.branch.id,
      detail: { before: { finding, sentHash, receivedAt } },
    });
  }
}

function columnsOf(kept: KeptPhoto): Record<string, unknown> {
  return {
    finding_ref: kept.finding,
    storage_key: kept.storageKey,
    sent_hash: kept.sentHash,
    width: kept.width,
    height: kept.height,
    bytes: kept.bytes,
  };
}
