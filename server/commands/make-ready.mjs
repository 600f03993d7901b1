import { buildIfNeeded, parts } from './build-product.mjs';
import { root } from './fingerprint.mjs';
import { installIfNeeded } from './install-packages.mjs';
import { refuse } from './run-process.mjs';

/** Installs and builds what is missing or out of date, side by side; ends with a sentence when something does not build. */
export async function makeReady(names) {
  process.chdir(root);
  await installIfNeeded();
  const builds = await Promise.all(
    names.map(async (name) => ({ name, ...(await buildIfNeeded(parts[name])) })),
  );
  for (const { name, built, code, output, seconds } of builds) {
    if (code !== 0) {
      process.stderr.write(output);
      refuse(`The ${name} could not be built; the messages above say why.`);
    }
    if (built) console.error(`Built the ${name} in ${seconds.toFixed(1)} s.`);
  }
}
