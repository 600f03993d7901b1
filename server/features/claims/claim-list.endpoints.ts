import type { Mounting } from '../../http/mount';
import type { Kit } from '../../kit';

/** Lists of claims and how each came about. */
export function mountClaimList(_mounting: Mounting, _kit: Kit): void {}
