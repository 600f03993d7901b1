import type { Mounting } from '../../http/mount';
import type { Kit } from '../../kit';

/** Warranty risk, computed in a worker. */
export function mountWarranty(_mounting: Mounting, _kit: Kit): void {}
