import { createHash } from 'node:crypto';
import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { readStamp, root, writeStamp } from './fingerprint.mjs';
import { refuse, runAside, runHere } from './run-process.mjs';

const STAMP = 'node_modules/.underseam-installed';

/**
 * Installs the packages of package-lock.json when they are missing, were installed for another lock file, or for another Node.
 * @returns {Promise<boolean>} whether it installed
 */
export async function installIfNeeded() {
  refuseOldNode();
  const wanted = stampOfLock();
  if (readStamp(STAMP) === wanted) return false;
  if (!(await isInstalledByHand())) {
    console.log('Installing the packages; the first time takes a minute or two.');
    const { code } = await npmCi();
    if (code !== 0) refuse(`The packages could not be installed: npm ended with code ${code}.`);
    if (!(await driverLoads())) {
      refuse(
        'The database driver could not be built; install a C++ compiler, make and Python, then run "npm rebuild better-sqlite3".',
      );
    }
  }
  writeStamp(STAMP, wanted);
  return true;
}

function refuseOldNode() {
  const { engines } = JSON.parse(readFileSync(path.join(root, 'package.json'), 'utf8'));
  const [major, minor] = engines.node.replace('>=', '').split('.').map(Number);
  const [ownMajor, ownMinor] = process.versions.node.split('.').map(Number);
  if (ownMajor > major || (ownMajor === major && ownMinor >= minor)) return;
  refuse(`Underseam needs Node ${engines.node}; this is ${process.versions.node}.`);
}

function stampOfLock() {
  const lock = readFileSync(path.join(root, 'package-lock.json'));
  const { modules } = process.versions;
  const hash = createHash('sha256').update(lock).digest('hex');
  return `${hash} ${process.platform}-${process.arch}-${modules}`;
}

/** Packages that somebody installed without us count when npm's own record of them agrees with the lock file. */
async function isInstalledByHand() {
  const record = path.join(root, 'node_modules/.package-lock.json');
  if (readStamp(STAMP) !== '' || !existsSync(record)) return false;
  const wanted = JSON.parse(readFileSync(path.join(root, 'package-lock.json'), 'utf8')).packages;
  const present = JSON.parse(readFileSync(record, 'utf8')).packages;
  const agrees = Object.entries(wanted).every(
    ([name, { version, optional, devOptional }]) =>
      name === '' || optional || devOptional || present[name]?.version === version,
  );
  return agrees && (await driverLoads());
}

async function driverLoads() {
  const probe = `new (require('better-sqlite3'))(':memory:').close()`;
  return (await runAside(process.execPath, ['-e', probe])).code === 0;
}

function npmCi() {
  const args = ['ci', '--include=dev', '--no-audit', '--no-fund'];
  const npm = process.env.npm_execpath ?? '';
  if (/npm-cli\.c?js$/.test(npm)) return runHere(process.execPath, [npm, ...args]);
  return runHere(process.platform === 'win32' ? 'npm.cmd' : 'npm', args);
}
