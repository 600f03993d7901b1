/** `npm start`: installs, builds and serves, whatever of it is needed. Uses only what comes with Node. */
import path from 'node:path';
import { root } from './fingerprint.mjs';
import { makeReady } from './make-ready.mjs';
import { runHere } from './run-process.mjs';

await makeReady(['server', 'pages']);
const { code } = await runHere(process.execPath, [path.join(root, 'dist/server/main.js')]);
process.exit(code);
