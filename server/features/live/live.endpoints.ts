import type { Mounting } from '../../http/mount';
import type { Kit } from '../../kit';

/** Not built yet. */
export function mountLive(_mounting: Mounting, _kit: Kit): void {}
