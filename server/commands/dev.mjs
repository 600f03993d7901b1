/** `npm run dev`: the server and the pages, each started again when its sources change. The pages' address is printed by ng. */
import { root } from './fingerprint.mjs';
import { installIfNeeded } from './install-packages.mjs';
import { runHere } from './run-process.mjs';

process.chdir(root);
await installIfNeeded();
const { code } = await runHere(process.execPath, [
  'node_modules/concurrently/dist/bin/concurrently.js',
  '--kill-others',
  '--names=server,pages',
  'tsx watch --conditions=underseam-source server/main.ts',
  'ng serve',
]);
process.exit(code);
