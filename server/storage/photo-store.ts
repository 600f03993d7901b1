import type { Config } from '../config';
import { BucketPhotoStore } from './bucket-photo-store';
import { FolderPhotoStore } from './folder-photo-store';

/** Keeps the bytes of photos under keys of our own making (letters, digits, `/`, `-`, `.`). */
export interface PhotoStore {
  /** Durable when settled; the same key again replaces. */
  put(key: string, bytes: Buffer): Promise<void>;
  /** `undefined`: nothing under this key. */
  get(key: string): Promise<Buffer | undefined>;
  /** Also settles when there was nothing. */
  remove(key: string): Promise<void>;
}

/** The store that the settings name: an S3-compatible one, or else a folder in the data folder. */
export function photoStoreOf(config: Config): PhotoStore {
  return config.bucket ? new BucketPhotoStore(config.bucket) : new FolderPhotoStore(config.data);
}
