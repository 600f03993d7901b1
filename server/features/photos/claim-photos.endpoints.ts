import type { Mounting } from '../../http/mount';
import type { Kit } from '../../kit';

/** Photos of claims: sent, listed, shown and taken off. */
export function mountClaimPhotos(_mounting: Mounting, _kit: Kit): void {}
