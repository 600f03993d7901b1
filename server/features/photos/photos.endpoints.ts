import type { Mounting } from '../../http/mount';
import type { Kit } from '../../kit';

export function mountPhotos(_mounting: Mounting, _kit: Kit): void {}
