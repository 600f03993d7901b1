/** `npm run check`: formatting, lint and types of everything, two at a time; ends with code 1 when one of them fails. */
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { root } from '../server/commands/fingerprint.mjs';
import { installIfNeeded } from '../server/commands/install-packages.mjs';
import { runAtOnce } from './support/run-steps.mjs';

const ngc = 'node_modules/@angular/compiler-cli/bundles/src/bin/ngc.js';

/** What is checked without running the product; `saidByBuild` marks what a build of the product compiles under the same settings. */
export const checks = [
  { name: 'lint', args: ['node_modules/eslint/bin/eslint.js', '.', '--max-warnings=0'] },
  { name: 'format', args: ['node_modules/prettier/bin/prettier.cjs', '--check', '.'] },
  {
    name: 'types of the server and its specs',
    args: ['node_modules/typescript/bin/tsc', '--noEmit', '-p', 'tsconfig.check.json'],
  },
  {
    name: 'types and templates of the pages',
    args: [ngc, '--noEmit', '-p', 'projects/dashboard/tsconfig.app.json'],
    saidByBuild: true,
  },
  {
    name: 'types of the service worker',
    args: ['node_modules/typescript/bin/tsc', '-p', 'projects/dashboard/tsconfig.worker.json'],
  },
  {
    name: "types of the pages' specs",
    args: [ngc, '--noEmit', '-p', 'projects/dashboard/tsconfig.spec.json'],
  },
];

if (import.meta.url === pathToFileURL(path.resolve(process.argv[1])).href) {
  process.chdir(root);
  await installIfNeeded();
  const ended = await runAtOnce(checks, 2);
  process.exit(ended.every(({ code }) => code === 0) ? 0 : 1);
}
