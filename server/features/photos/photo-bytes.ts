import type { PhotoStore } from '../../storage/photo-store';
import type { RemadePhoto } from './remake-photo';

/** How large a photo is asked for. */
export type PhotoSize = 'whole' | 'small';

/** Under which key the bytes of a photo lie in one of its sizes. */
export function keyOf(storageKey: string, size: PhotoSize): string {
  return size === 'small' ? `${storageKey}-small.jpg` : `${storageKey}.jpg`;
}

/** Keeps a photo in both sizes. */
export async function keepBytes(
  photos: PhotoStore,
  storageKey: string,
  { whole, small }: RemadePhoto,
): Promise<void> {
  await Promise.all([
    photos.put(keyOf(storageKey, 'whole'), whole),
    photos.put(keyOf(storageKey, 'small'), small),
  ]);
}

/** Lets go of the bytes of a photo that the record no longer has. Bytes that stay behind are harmless, so nothing waits or fails for them. */
export async function dropBytes(photos: PhotoStore, storageKey: string): Promise<void> {
  await Promise.allSettled([
    photos.remove(keyOf(storageKey, 'whole')),
    photos.remove(keyOf(storageKey, 'small')),
  ]);
}
