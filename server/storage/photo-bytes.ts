import type { PhotoStore } from './photo-store';

/** The sizes in which a photo is kept. */
const PHOTO_SIZES = ['whole', 'small'] as const;
export type PhotoSize = (typeof PHOTO_SIZES)[number];

/** Under which key the bytes of a photo lie in one of its sizes. */
export function photoKey(storageKey: string, size: PhotoSize): string {
  return size === 'small' ? `${storageKey}-small.jpg` : `${storageKey}.jpg`;
}

/** Keeps a photo in every size. */
export async function keepPhotoBytes(
  photos: PhotoStore,
  storageKey: string,
  made: Readonly<Record<PhotoSize, Buffer>>,
): Promise<void> {
  await Promise.all(PHOTO_SIZES.map((size) => photos.put(photoKey(storageKey, size), made[size])));
}

/** Lets go of the bytes of a photo that the record no longer has. Bytes that stay behind are harmless, so nothing fails for them. */
export async function dropPhotoBytes(photos: PhotoStore, storageKey: string): Promise<void> {
  await Promise.allSettled(PHOTO_SIZES.map((size) => photos.remove(photoKey(storageKey, size))));
}

/** Keeping, reading and letting go of the bytes of photos in one store. */
export function photoBytesOf(photos: PhotoStore) {
  return {
    keep: (storageKey: string, made: Readonly<Record<PhotoSize, Buffer>>): Promise<void> =>
      keepPhotoBytes(photos, storageKey, made),
    read: (storageKey: string, size: PhotoSize): Promise<Buffer | undefined> =>
      photos.get(photoKey(storageKey, size)),
    drop: (storageKey: string): Promise<void> => dropPhotoBytes(photos, storageKey),
  };
}
