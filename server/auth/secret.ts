import { createSecretKey, hkdfSync, randomBytes, type KeyObject } from 'node:crypto';
import { chmodSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { ConfigRefused, type Config } from '../config';

/** What signs: a key each for access tokens, refresh cookies and links in mails, so that none can stand for another. */
export interface SigningKeys {
  /** A `KeyObject` made once: jsonwebtoken verifies with it about fifty times faster than with a string. */
  tokens: KeyObject;
  cookies: KeyObject;
  mails: KeyObject;
}

/** The signing keys of UNDERSEAM_SECRET, or of the secret kept in the data folder, which is made on first use. */
export function readSecret(config: Pick<Config, 'secret' | 'data'>): SigningKeys {
  const secret = config.secret ?? keptSecret(config.data);
  const derived = (purpose: string) =>
    createSecretKey(Buffer.from(hkdfSync('sha256', secret, '', `underseam ${purpose}`, 32)));
  return {
    tokens: derived('access tokens'),
    cookies: derived('refresh cookies'),
    mails: derived('links in mails'),
  };
}

/** Reads the data folder's secret; only the owner may read the file. */
function keptSecret(folder: string): string {
  const file = join(folder, 'secret');
  let secret: string;
  try {
    mkdirSync(folder, { recursive: true });
    writeOnce(file, `${randomBytes(32).toString('hex')}\n`);
    chmodSync(file, 0o600);
    secret = readFileSync(file, 'utf8').trim();
  } catch {
    throw new ConfigRefused(
      `The file ${file}, which holds the secret that signs tokens, cannot be read or made; check the data folder's permissions.`,
    );
  }
  if (!/^[0-9a-f]{64}$/.test(secret)) {
    throw new ConfigRefused(
      `The file ${file} does not hold the secret that was made for it; remove it, and everybody signs in anew.`,
    );
  }
  return secret;
}

function writeOnce(file: string, text: string): void {
  try {
    writeFileSync(file, text, { flag: 'wx', mode: 0o600, flush: true });
  } catch (error) {
    // It was made before: that one counts.
    if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error;
  }
}
