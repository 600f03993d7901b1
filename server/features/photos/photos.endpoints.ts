import { randomUUID } from 'node:crypto';
import { PhotoWriter } from '#db/photo-writer';
import type { Deed } from '#db/queries/audit';
import { findPhoto, listPhotos, standsJob, type PhotoRow } from '#db/queries/photos';
import type { Scope, ScopedBranch } from '#db/scope';
import {
  getPhoto,
  listPhotos as listContract,
  putPhoto as putContract,
  removePhoto,
  type Photo,
} from '#shared/contracts/photos';
import { senderOf } from '#shared/domain/preconditions';
import { notFound } from '#shared/domain/refusal';
import { deedOf } from '../../http/deed';
import { mount, namedBranch, type Call, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { dropPhotoBytes, keepPhotoBytes, photoKey } from '../../storage/photo-bytes';
import { putPhoto, type PhotoBench } from './put-photo';
import { remakePhoto } from './remake-photo';
import { Turns } from './take-turns';

/** Pictures unfolded at once: each takes up to some hundred megabytes while it is made anew. */
const AT_ONCE = 2;

/** Photos of jobs and of their findings (rule 78): sent, listed, shown and taken off. */
export function mountPhotos(mounting: Mounting, kit: Kit): void {
  const { store, photos } = kit;
  const turns = new Turns(AT_ONCE);
  const exists = ({ branch, scope, params }: Named): boolean =>
    branch !== undefined && standsJob(store.scoped(scope), branch.id, params.jobRef);
  const bench = (branch: ScopedBranch): PhotoBench => ({
    writer: new PhotoWriter(store, branch),
    write: (work) => store.queue.write(work),
    remake: (bytes) => turns.take(() => remakePhoto(bytes)),
    keepBytes: (storageKey, photo) => keepPhotoBytes(photos, storageKey, photo),
    dropBytes: (storageKey) => dropPhotoBytes(photos, storageKey),
    newName: randomUUID,
  });

  mount(
    mounting,
    putContract,
    async (call) => {
      const sent = { ...call.params, finding: call.query.finding ?? null, bytes: call.body.bytes };
      const { status, row } = await putPhoto(bench(namedBranch(call)), sent, deedOn(call));
      return { status: status === 'created' ? 201 : 200, body: tellPhoto(row) };
    },
    { exists },
  );

  mount(
    mounting,
    listContract,
    (call) => {
      const rows = listPhotos(store.scoped(call.scope), namedBranch(call).id, call.params.jobRef);
      return { body: { items: rows.map(tellPhoto) } };
    },
    { exists },
  );

  mount(
    mounting,
    getPhoto,
    async (call) => {
      const { jobRef, photo } = call.params;
      const db = store.scoped(call.scope);
      const row = findPhoto(db, namedBranch(call).id, jobRef, photo);
      const bytes = row && (await photos.get(photoKey(row.storageKey, call.query.size)));
      if (!bytes) throw notFound();
      return { body: bytes };
    },
    { exists },
  );

  mount(
    mounting,
    removePhoto,
    async (call) => {
      const { jobRef, photo } = call.params;
      const writer = new PhotoWriter(store, namedBranch(call));
      const former = await store.queue.write(() => {
        const found = writer.find(jobRef, photo);
        if (!found) throw notFound();
        writer.remove(jobRef, found, deedOn(call));
        return found;
      });
      await dropPhotoBytes(photos, former.storageKey);
      return {};
    },
    { exists },
  );
}

interface Named {
  branch: ScopedBranch | undefined;
  scope: Scope;
  params: { jobRef: string };
}

/** As the trail names it. */
function deedOn(call: Call<{ jobRef: string; photo: string }>): Deed {
  const { jobRef, photo } = call.params;
  return deedOf(call, `/branches/${namedBranch(call).code}/jobs/${jobRef}/photos/${photo}`);
}

function tellPhoto(row: PhotoRow): Photo {
  const { photo, finding, width, height, bytes, receivedAt } = row;
  return { photo, finding, width, height, bytes, receivedAt, by: senderOf(row) };
}
