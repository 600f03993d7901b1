import type { Store } from '#db/store';
import type { Clock } from './clock';
import type { Config } from './config';
import type { ImportDesk } from './features/imports/import-desk';
import type { LiveFeed } from './live/live-feed';
import type { Outbox } from './mail/outbox';
import type { PhotoStore } from './storage/photo-store';
import type { PasswordThread } from './workers/password-thread';
import type { ReadPool } from './workers/read-pool';

/** What the features are given to work with; made once by `createApp`'s caller. */
export interface Kit {
  store: Store;
  clock: Clock;
  config: Config;
  /** Heavy reads and exports, off the request thread. */
  reads: ReadPool;
  /** Password checks, on a thread of their own. */
  passwords: PasswordThread;
  outbox: Outbox;
  /** Where the bytes of photos lie. */
  photos: PhotoStore;
  /** Files being checked and written. */
  imports: ImportDesk;
  /** Tells open pages what changed. */
  live: LiveFeed;
  version: string;
}
