const NAME = 'underseam.outbox';
/** Longer than any one sending may take; a window that was closed meanwhile blocks the others no longer than this, ms. */
const LEASE = 240_000;

/**
 * Does some work unless another window of this device is doing it, so that only one of them sends. Held by a Web Lock, which
 * goes with its window; in a browser without them by a note that runs out. Gives what the work gave, or `undefined` when it was
 * not this window's turn.
 */
export async function inTurn<T>(work: () => Promise<T>): Promise<T | undefined> {
  const locks = (navigator as Partial<Navigator>).locks;
  if (!locks) return underLease(work);
  return locks.request(NAME, { ifAvailable: true }, (lock) => (lock ? work() : undefined));
}

async function underLease<T>(work: () => Promise<T>): Promise<T | undefined> {
  try {
    if (Number(localStorage.getItem(NAME) ?? 0) > Date.now()) return undefined;
    localStorage.setItem(NAME, String(Date.now() + LEASE));
  } catch {
    // Without storage there is nothing that another window could send too.
  }
  try {
    return await work();
  } finally {
    try {
      localStorage.removeItem(NAME);
    } catch {
      // As above.
    }
  }
}
