import { existsSync, rmSync } from 'node:fs';
import path from 'node:path';
import { fingerprintOf, readStamp, root, writeStamp } from './fingerprint.mjs';
import { runAside } from './run-process.mjs';

const SETTINGS = ['package.json', 'package-lock.json', 'tsconfig.json'];

/** What is built: from which sources, into what, by which command. */
export const parts = {
  server: {
    sources: ['shared', 'db', 'server', 'seeds', 'tsconfig.server.json', ...SETTINGS],
    results: ['dist/shared', 'dist/db', 'dist/server', 'dist/seeds'],
    entry: 'dist/server/main.js',
    command: ['node_modules/typescript/bin/tsc', '-p', 'tsconfig.server.json', '--noEmitOnError'],
  },
  pages: {
    sources: [
      ...['shared', 'projects/dashboard', 'angular.json'],
      ...['server/commands/build-pages.mjs', 'server/commands/precache-list.mjs'],
      ...SETTINGS,
    ],
    results: ['dist/dashboard'],
    entry: 'dist/dashboard/index.html',
    command: ['server/commands/build-pages.mjs'],
  },
};

/**
 * Builds a part of the product unless its sources are those it was last built from.
 * @returns {Promise<{ built: boolean, code: number, output: string, seconds: number }>}
 */
export async function buildIfNeeded({ sources, results, entry, command }) {
  const stamp = `${results.at(-1)}.stamp`;
  const wanted = `${fingerprintOf(sources)} ${process.version}`;
  if (readStamp(stamp) === wanted && existsSync(path.join(root, entry))) {
    return { built: false, code: 0, output: '', seconds: 0 };
  }
  // First the stamp and what a removed source may have left, so that a build broken off is not taken for one.
  for (const place of [stamp, ...results]) {
    rmSync(path.join(root, place), { recursive: true, force: true });
  }
  const ended = await runAside(process.execPath, command, { NG_CLI_ANALYTICS: 'false' });
  if (ended.code === 0) writeStamp(stamp, wanted);
  return { built: true, ...ended };
}
