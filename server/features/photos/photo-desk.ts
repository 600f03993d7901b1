import { randomUUID } from 'node:crypto';
import { PhotoWriter } from '#db/photo-writer';
import type { Deed } from '#db/queries/audit';
import {
  findPhoto,
  listPhotos,
  standsPlace,
  type PhotoPlace,
  type PhotoRow,
} from '#db/queries/photos';
import type { Scope, ScopedBranch } from '#db/scope';
import type { Store } from '#db/store';
import type { ClaimPhoto, Photo } from '#shared/contracts/photos';
import { senderOf } from '#shared/domain/preconditions';
import { notFound } from '#shared/domain/refusal';
import { putPhoto, type PhotoBench, type SentPhoto } from './put-photo';
import { remakePhoto, type RemadePhoto } from './remake-photo';
import { Turns } from './take-turns';

/** Pictures unfolded at once: each takes up to some hundred megabytes while it is made anew. */
const AT_ONCE = 2;
/** Of the whole process: what a picture takes is the same whatever it belongs to. */
const turns = new Turns(AT_ONCE);

/** Where the bytes of photos lie, each in every size. */
export interface PhotoBytes {
  keep: (storageKey: string, photo: RemadePhoto) => Promise<void>;
  read: (storageKey: string, size: 'whole' | 'small') => Promise<Buffer | undefined>;
  drop: (storageKey: string) => Promise<void>;
}

/** A place at a branch, and the scope in which the caller reads. */
export interface PhotoSpot {
  branch: ScopedBranch;
  scope: Scope;
  place: PhotoPlace;
}

/** What can be done with the photos of jobs and of claims; the same for both. */
export class PhotoDesk {
  constructor(
    private readonly store: Store,
    private readonly photoBytes: PhotoBytes,
  ) {}

  /** Whether there is what the photos would belong to. */
  stands({ branch, scope, place }: PhotoSpot): boolean {
    return standsPlace(this.store.scoped(scope), branch.id, place);
  }

  /** Takes a photo: its bytes and its row. */
  async put(
    branch: ScopedBranch,
    sent: SentPhoto,
    deed: Deed,
  ): Promise<{ status: 201 | 200; body: Photo }> {
    const { store, photoBytes } = this;
    const bench: PhotoBench = {
      writer: new PhotoWriter(store, branch),
      write: (work) => store.queue.write(work),
      remake: (bytes) => turns.take(() => remakePhoto(bytes)),
      keepBytes: photoBytes.keep,
      dropBytes: photoBytes.drop,
      newName: randomUUID,
    };
    const { status, row } = await putPhoto(bench, sent, deed);
    return { status: status === 'created' ? 201 : 200, body: tellPhoto(row) };
  }

  /** The photos of a place, in the order received. */
  list({ branch, scope, place }: PhotoSpot): Photo[] {
    return listPhotos(this.store.scoped(scope), branch.id, place).map(tellPhoto);
  }

  /** The bytes of a photo in one of its sizes. */
  async bytes(spot: PhotoSpot, photo: string, size: 'whole' | 'small'): Promise<Buffer> {
    const row = findPhoto(this.store.scoped(spot.scope), spot.branch.id, spot.place, photo);
    const bytes = row && (await this.photoBytes.read(row.storageKey, size));
    if (!bytes) throw notFound();
    return bytes;
  }

  /** Takes a photo off its place, its bytes with it. */
  async remove({ branch, place }: PhotoSpot, photo: string, deed: Deed): Promise<void> {
    const writer = new PhotoWriter(this.store, branch);
    const former = await this.store.queue.write(() => {
      const found = writer.find(place, photo);
      if (!found) throw notFound();
      writer.remove(place, found, deed);
      return found;
    });
    await this.photoBytes.drop(former.storageKey);
  }
}

/** A photo of a claim, which shows no finding. */
export function tellClaimPhoto({ finding: _none, ...photo }: Photo): ClaimPhoto {
  return photo;
}

function tellPhoto(row: PhotoRow): Photo {
  const { photo, finding, width, height, bytes, receivedAt } = row;
  return { photo, finding, width, height, bytes, receivedAt, by: senderOf(row) };
}
