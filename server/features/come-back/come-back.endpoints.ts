import type { Mounting } from '../../http/mount';
import type { Kit } from '../../kit';

/** Rot left on cars and the marks people set on it. */
export function mountComeBack(_mounting: Mounting, _kit: Kit): void {
  // The calls are mounted here.
}
