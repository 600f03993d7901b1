/**
 * Runs a command of this folder by its name, `node server/commands/run.mjs backup …`, as it was built last: beside a running
 * server nothing is installed or built anew under its feet. Only when nothing was built yet it installs and builds.
 */
import { existsSync } from 'node:fs';
import path from 'node:path';
import { root } from './fingerprint.mjs';
import { makeReady } from './make-ready.mjs';
import { runHere } from './run-process.mjs';

const [name, ...args] = process.argv.slice(2);
const command = path.join(root, `dist/server/commands/${name}.js`);
if (!existsSync(command)) await makeReady(['server']);
const { code } = await runHere(process.execPath, [command, ...args]);
process.exit(code);
