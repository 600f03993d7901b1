import { runHere } from '../../server/commands/run-process.mjs';
import { canInstallChromium, findChromium } from './find-chromium.mjs';

/** Finds a Chromium, or installs Debian's when that needs no one's leave; otherwise says what is missing and answers undefined. */
export async function provideChromium() {
  const found = findChromium();
  if (found) return found;
  if (process.env.CHROME) {
    console.error(`CHROME names ${process.env.CHROME}, which is not a program that can be run.`);
    return undefined;
  }
  if (!canInstallChromium()) {
    console.error(
      'The journeys need a browser: install Chromium, or set CHROME to the path of one.',
    );
    return undefined;
  }
  console.log('No browser is here; installing Debian’s chromium-headless-shell.');
  const quiet = { DEBIAN_FRONTEND: 'noninteractive' };
  await runHere('apt-get', ['update', '-qq'], quiet);
  await runHere(
    'apt-get',
    ['install', '-qq', '-y', '--no-install-recommends', 'chromium-headless-shell'],
    quiet,
  );
  const installed = findChromium();
  if (!installed) console.error('apt-get could not install a browser; its messages say why.');
  return installed;
}
