import type { Mounting } from '../../http/mount';
import type { Kit } from '../../kit';

export function mountUsual(_mounting: Mounting, _kit: Kit): void {}
