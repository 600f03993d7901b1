/**
 * `npm test`: everything. Installs if needed, checks formatting, lint and types, builds, then runs the unit and API specs and
 * the journeys in a real browser. Goes on after a failure, to tell all of them at once; the last line counts them.
 */
import { existsSync, readFileSync, rmSync } from 'node:fs';
import { buildIfNeeded, parts } from '../server/commands/build-product.mjs';
import { root } from '../server/commands/fingerprint.mjs';
import { installIfNeeded } from '../server/commands/install-packages.mjs';
import { checks } from './checks.mjs';
import { provideChromium } from './support/provide-chromium.mjs';
import { runAloud, runAtOnce, tell } from './support/run-steps.mjs';
import { tally } from './support/tally.mjs';

process.chdir(root);
const begun = Date.now();
await timed('packages', async () => {
  await installIfNeeded();
  return 0;
});

const steps = [];
let chromium;
steps.push(
  await timed('browser', async () => {
    chromium = await provideChromium();
    return chromium ? 0 : 1;
  }),
);
const builds = Object.entries(parts).map(([name, part]) => ({
  name: `build of the ${name}`,
  run: () => buildIfNeeded(part),
}));
const others = checks.filter(({ saidByBuild }) => !saidByBuild);
steps.push(...(await runAtOnce([...builds, ...others], 2)));
const canBrowse = steps.every(({ name, code }) => code === 0 || !/^(browser|build)/.test(name));

const built = steps.every(({ name, code }) => code === 0 || !name.startsWith('build'));
steps.push(await runJest('unit and API specs', [], { UNDERSEAM_BUILT: built ? 'on' : 'off' }));
if (canBrowse) {
  steps.push(
    await runJest('journeys', ['--config', 'test/journeys/jest.config.mjs'], { CHROME: chromium }),
  );
} else {
  steps.push({ name: 'the journeys, for want of a browser or a build,', code: 1 });
}

const { passed, failed, reasons } = tally(steps);
for (const reason of reasons) console.log(`FAILED: ${reason}`);
console.log(`Everything took ${((Date.now() - begun) / 1000).toFixed(0)} s.`);
console.log(`${passed} passed, ${failed} failed`);
process.exit(failed === 0 ? 0 : 1);

async function timed(name, work) {
  const since = Date.now();
  return tell(name, await work(), (Date.now() - since) / 1000);
}

async function runJest(name, args, env = {}) {
  const file = `test/output/${name.replaceAll(' ', '-')}.json`;
  rmSync(file, { force: true });
  const ended = await runAloud({
    name,
    args: ['node_modules/jest/bin/jest.js', '--ci', '--json', `--outputFile=${file}`, ...args],
    env,
  });
  return { ...ended, report: existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : null };
}
