/** Runs a built command of this folder by its name: `node server/commands/run.mjs backup …`. Installs and builds first if needed. */
import path from 'node:path';
import { root } from './fingerprint.mjs';
import { makeReady } from './make-ready.mjs';
import { runHere } from './run-process.mjs';

const [name, ...args] = process.argv.slice(2);
await makeReady(['server']);
const command = path.join(root, `dist/server/commands/${name}.js`);
const { code } = await runHere(process.execPath, [command, ...args]);
process.exit(code);
