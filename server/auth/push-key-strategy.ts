import type { Strategy } from 'passport';
import { matchPushKey, stampPushKey } from '#db/queries/push-keys';
import type { Store } from '#db/store';
import type { Clock } from '../clock';
import { bearerToken } from './bearer-token';
import type { KeyCaller } from './caller';

/** Between two notes of a key's last use. */
const STAMP_EVERY_MS = 60_000;

/** Recognises a branch's own system by its push key `usk_<id>_<secret>`. */
export function makePushKeyStrategy(store: Store, clock: Clock): Strategy & { name: string } {
  const stampedAt = new Map<string, number>();
  return {
    name: 'push-key',
    authenticate(request) {
      const shown = /^usk_([0-9a-f]{12})_([0-9a-f]{64})$/.exec(bearerToken(request) ?? '');
      const key = shown && matchPushKey(store.unscoped, { id: shown[1]!, secret: shown[2]! });
      if (!key) {
        this.fail(401);
        return;
      }
      noteUse(store, stampedAt, key.id, clock.now());
      const caller: KeyCaller = { kind: 'key', ...key };
      this.success(caller);
    },
  };
}

/** The key as it is shown once. */
export function pushKeyText(id: string, secret: string): string {
  return `usk_${id}_${secret}`;
}

/** Notes a key's use once a minute at most, in a commit that nobody waits for and that the request's own write shares. */
function noteUse(store: Store, stampedAt: Map<string, number>, id: string, now: Date): void {
  if (now.getTime() - (stampedAt.get(id) ?? 0) < STAMP_EVERY_MS) return;
  stampedAt.set(id, now.getTime());
  store.queue
    .write(() => stampPushKey(store.unscoped, id, now.toISOString()))
    // A lost stamp is no reason to refuse a job; a database that fails tells the job's own write.
    .catch(() => stampedAt.delete(id));
}
