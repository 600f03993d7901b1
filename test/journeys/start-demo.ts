import type { Served } from '../bench/serve';
import { serveDemo } from './served-demo';

declare global {
  /** What `stop-demo.ts` stops; both run in the same process. */
  var journeysDemo: Served | undefined;
}

/** Before the first journey: one demo network for all of them. */
export default async function startDemo(): Promise<void> {
  globalThis.journeysDemo = await serveDemo();
}
