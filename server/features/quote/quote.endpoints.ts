import type { Mounting } from '../../http/mount';
import type { Kit } from '../../kit';

/** What the next car is likely to take. */
export function mountQuote(_mounting: Mounting, _kit: Kit): void {
  // The call is mounted here.
}
