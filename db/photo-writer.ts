import type { Knex } from 'knex';
import { sql, type Connection } from './database';
import { recordAudit, type Deed } from './queries/audit';
import {
  findPhoto,
  listPhotos,
  PHOTO_TABLES,
  standsPlace,
  type PhotoPlace,
  type PhotoRow,
} from './queries/photos';
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
 * Writes what the record has of one branch's photos, of jobs and of claims. Bound to its branch for life; every method runs inside
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

  /** Whether there is a job or claim that photos can belong to at this moment. */
  stands(place: PhotoPlace): boolean {
    return standsPlace(this.reader, this.branch.id, place);
  }

  /** How many photos a place has. */
  count(place: PhotoPlace): number {
    return listPhotos(this.reader, this.branch.id, place).length;
  }

  /** A photo as it stands at this moment. */
  find(place: PhotoPlace, photo: string): PhotoRow | undefined {
    return findPhoto(this.reader, this.branch.id, place, photo);
  }

  /** Adds a photo that was not there. */
  add(place: PhotoPlace, photo: string, kept: KeptPhoto, { actor, at }: Deed): void {
    const sender = { received_at: at, person_id: actor.personId, push_key_id: actor.pushKeyId };
    const row = { ...this.keyOf(place, photo), ...columnsOf(place, kept), ...sender };
    this.connection.run(tableOf(place).insert(row));
  }

  /** Puts another photo, or another finding, in the place of one; who sent it last is its sender. */
  replace(place: PhotoPlace, former: PhotoRow, kept: KeptPhoto, deed: Deed): void {
    const { actor, at } = deed;
    const sender = { received_at: at, person_id: actor.personId, push_key_id: actor.pushKeyId };
    const row = this.row(place, former.photo);
    this.connection.run(row.update({ ...columnsOf(place, kept), ...sender }));
    this.tell('photo.replace', place, former, deed);
  }

  /** Takes a photo out of the record. */
  remove(place: PhotoPlace, former: PhotoRow, deed: Deed): void {
    this.connection.run(this.row(place, former.photo).delete());
    this.tell('photo.remove', place, former, deed);
  }

  private row(place: PhotoPlace, photo: string): Knex.QueryBuilder {
    return tableOf(place).where(this.keyOf(place, photo));
  }

  private keyOf({ of, ref }: PhotoPlace, photo: string): Record<string, unknown> {
    return { branch_id: this.branch.id, [PHOTO_TABLES[of].ref]: ref, photo_ref: photo };
  }

  private tell(
    action: string,
    { of }: PhotoPlace,
    { finding, sentHash, receivedAt }: PhotoRow,
    { actor, at, subject }: Deed,
  ): void {
    recordAudit(new UnscopedDb(this.connection), {
      at,
      actor,
      action,
      subject,
      branchId: this.branch.id,
      detail: { before: { ...(of === 'job' && { finding }), sentHash, receivedAt } },
    });
  }
}

/** Named in full, so that the tests see which tables of branches are written past a scope. */
function tableOf({ of }: PhotoPlace): Knex.QueryBuilder {
  return of === 'job' ? sql('photos') : sql('claim_photos');
}

function columnsOf({ of }: PhotoPlace, kept: KeptPhoto): Record<string, unknown> {
  return {
    ...(of === 'job' && { finding_ref: kept.finding }),
    storage_key: kept.storageKey,
    sent_hash: kept.sentHash,
    width: kept.width,
    height: kept.height,
    bytes: kept.bytes,
  };
}
