import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';

/** The project's folder, wherever the command was called from. */
export const root = path.join(import.meta.dirname, '../..');

/** A hash of the names and contents of files and folders (specs left out): equal when a build of them would be equal. */
export function fingerprintOf(places) {
  const hash = createHash('sha256');
  for (const file of places.flatMap(filesIn).sort()) {
    hash
      .update(`${file}\0`)
      .update(readFileSync(path.join(root, file)))
      .update('\0');
  }
  return hash.digest('hex');
}

/** What a stamp file says, or an empty text when there is none. */
export function readStamp(file) {
  const whole = path.join(root, file);
  return existsSync(whole) ? readFileSync(whole, 'utf8').trim() : '';
}

/** Leaves a stamp. */
export function writeStamp(file, text) {
  const whole = path.join(root, file);
  mkdirSync(path.dirname(whole), { recursive: true });
  writeFileSync(whole, `${text}\n`);
}

function filesIn(place) {
  const whole = path.join(root, place);
  if (!existsSync(whole)) return [];
  if (statSync(whole).isFile()) return [place];
  return readdirSync(whole)
    .filter((name) => !name.endsWith('.spec.ts'))
    .flatMap((name) => filesIn(`${place}/${name}`));
}
