import { accessSync, constants, existsSync, readFileSync, statSync } from 'node:fs';
import path from 'node:path';

/** The one without a window of its own goes before others: it is what the journeys need, and no more. */
const NAMES = [
  'chromium-headless-shell',
  'chromium',
  'chromium-browser',
  'google-chrome',
  'google-chrome-stable',
  'chrome',
];
const PLACES = [
  '/usr/lib/chromium/chromium-headless-shell',
  '/usr/lib/chromium/chromium',
  '/snap/bin/chromium',
  '/Applications/Chromium.app/Contents/MacOS/Chromium',
  '/Applications/Google Chrome.app/Contents/MacOS/Google Chrome',
  'C:\\Program Files\\Google\\Chrome\\Application\\chrome.exe',
];

/** The path of a Chromium on this machine: CHROME, then the search path, then usual places; undefined when there is none. */
export function findChromium(env = process.env, places = PLACES) {
  if (env.CHROME) return isProgram(env.CHROME) ? env.CHROME : undefined;
  const onPath = (env.PATH ?? '')
    .split(path.delimiter)
    .flatMap((folder) => NAMES.map((name) => path.join(folder, name)));
  return [...onPath, ...places].find(isProgram);
}

/** Whether a missing browser can be installed here without asking anyone: Debian, as root. */
export function canInstallChromium(release = readRelease(), user = process.getuid?.()) {
  return user === 0 && /^ID="?debian"?$/m.test(release);
}

function readRelease() {
  return existsSync('/etc/os-release') ? readFileSync('/etc/os-release', 'utf8') : '';
}

function isProgram(file) {
  try {
    accessSync(file, constants.X_OK);
    return statSync(file).isFile();
  } catch {
    return false;
  }
}
