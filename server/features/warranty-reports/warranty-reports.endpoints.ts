import type { Mounting } from '../../http/mount';
import type { Kit } from '../../kit';

/** The warranty-risk report: made as of a day, issued and kept, and the schedule that issues it. */
export function mountWarrantyReports(_mounting: Mounting, _kit: Kit): void {}
