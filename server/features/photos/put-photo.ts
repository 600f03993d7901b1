import { createHash } from 'node:crypto';
import type { PhotoWriter } from '#db/photo-writer';
import type { Deed } from '#db/queries/audit';
import type { PhotoPlace, PhotoRow } from '#db/queries/photos';
import { MOST_PHOTOS } from '#shared/contracts/photos';
import { notFound, refuseInput } from '#shared/domain/refusal';
import type { RemadePhoto } from './remake-photo';

/** A photo as it comes. */
export interface SentPhoto {
  place: PhotoPlace;
  photo: string;
  /** Of a job's photo: the finding it shows. */
  finding: string | null;
  bytes: Buffer;
}

/** What putting a photo needs beside the photo. */
export interface PhotoBench {
  writer: PhotoWriter;
  /** Runs in the next commit. */
  write: <T>(work: () => T) => Promise<T>;
  remake: (bytes: Buffer) => Promise<RemadePhoto>;
  keepBytes: (storageKey: string, photo: RemadePhoto) => Promise<void>;
  dropBytes: (storageKey: string) => Promise<void>;
  /** A name that no photo has had. */
  newName: () => string;
}

/**
 * Takes a photo: its bytes first, its row second, so that no stop in the middle leaves a row without bytes. Every sending has
 * a key of its own, so that bytes are never taken away from under a row that another sending has just written. The same photo
 * again changes nothing.
 */
export async function putPhoto(
  bench: PhotoBench,
  sent: SentPhoto,
  deed: Deed,
): Promise<{ status: 'created' | 'replaced' | 'unchanged'; row: PhotoRow }> {
  const sentHash = createHash('sha256').update(sent.bytes).digest('hex');
  const known = await bench.write(() => settleKnown(bench.writer, sent, sentHash, deed));
  if (known) return known;
  const remade = await bench.remake(sent.bytes);
  const storageKey = `${bench.writer.branch.code}/${bench.newName()}`;
  const { width, height, whole } = remade;
  const kept = { finding: sent.finding, storageKey, sentHash, width, height, bytes: whole.length };
  try {
    await bench.keepBytes(storageKey, remade);
    const { formerKey, ...put } = await bench.write(() => {
      const { writer } = bench;
      // Once more: the place may have gone, and the same photo may have come, while this one was made.
      const meanwhile = settleKnown(writer, sent, sentHash, deed);
      if (meanwhile) return { ...meanwhile, formerKey: storageKey };
      const former = writer.find(sent.place, sent.photo);
      if (former) writer.replace(sent.place, former, kept, deed);
      else writer.add(sent.place, sent.photo, kept, deed);
      const row = writer.find(sent.place, sent.photo) as PhotoRow;
      const status = former ? ('replaced' as const) : ('created' as const);
      return { status, row, formerKey: former?.storageKey };
    });
    if (formerKey !== undefined) await bench.dropBytes(formerKey);
    return put;
  } catch (error) {
    await bench.dropBytes(storageKey);
    throw error;
  }
}

/** What can be said without the picture: that there is nothing it could belong to, that there is no room, or that it is there already. Runs inside a write. */
function settleKnown(
  writer: PhotoWriter,
  { place, photo, finding }: SentPhoto,
  sentHash: string,
  deed: Deed,
): { status: 'replaced' | 'unchanged'; row: PhotoRow } | undefined {
  if (!writer.stands(place)) throw notFound();
  const former = writer.find(place, photo);
  if (!former && writer.count(place) >= MOST_PHOTOS) {
    const message = `the ${place.of} has ${MOST_PHOTOS} photos, the most there can be; take one off first`;
    throw refuseInput([{ path: '', message }]);
  }
  if (former?.sentHash !== sentHash) return undefined;
  if (former.finding === finding) return { status: 'unchanged', row: former };
  writer.replace(place, former, { ...former, finding }, deed);
  return { status: 'replaced', row: writer.find(place, photo) as PhotoRow };
}
