import { createHash } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';

const KEPT = /\.(?:js|css|woff2|svg|png|webmanifest)$/;
/** As the build and `server/http/dashboard.ts` have it: a name with its content's hash never means anything else. */
const HASHED = /-[A-Z0-9]{8}\.\w+$/;

/**
 * What the service worker keeps of the built pages: every file by its address, and the page under `/`; those whose name has no
 * hash with a revision, so that a changed one is fetched anew and the others are not.
 */
export function precacheList(folder) {
  const files = readdirSync(folder, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && KEPT.test(entry.name))
    .map((entry) => path.relative(folder, path.join(entry.parentPath, entry.name)))
    .map((file) => file.split(path.sep).join('/'))
    .sort();
  return [
    { url: '/', revision: hashOf(path.join(folder, 'index.html')) },
    ...files.map((file) => ({
      url: `/${file}`,
      revision: HASHED.test(file) ? null : hashOf(path.join(folder, file)),
    })),
  ];
}

function hashOf(file) {
  return createHash('sha256').update(readFileSync(file)).digest('hex').slice(0, 16);
}
