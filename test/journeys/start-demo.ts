import type { Served } from '../bench/serve';
import { serveDemos } from './served-demo';

declare global {
  /** What `stop-demo.ts` stops; both run in the same process. */
  var journeysDemo: Served | undefined;
}

/** Before the first journey: a demo network for each of those that run side by side. */
export default async function startDemo({ maxWorkers }: { maxWorkers: number }): Promise<void> {
  globalThis.journeysDemo = await serveDemos(maxWorkers);
}
