import { chmodSync, mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { ConfigRefused } from '../config';
import { readSecret } from './secret';

let folder = '';
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'underseam-secret-'));
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));

const keysOf = (secret: string | undefined, data = folder): string[] => {
  const { tokens, cookies } = readSecret({ secret, data });
  return [tokens, cookies].map((key) => key.export().toString('hex'));
};

describe('readSecret', () => {
  it('given no setting, makes a secret that only its owner reads, and keeps it', () => {
    const data = join(folder, 'not', 'there yet');
    const first = keysOf(undefined, data);
    expect(statSync(join(data, 'secret')).mode & 0o777).toBe(0o600);
    expect(keysOf(undefined, data)).toEqual(first);
    expect(new Set(first).size).toBe(2);
  });

  it('given another folder, makes another secret', () => {
    expect(keysOf(undefined, join(folder, 'a'))).not.toEqual(keysOf(undefined, join(folder, 'b')));
  });

  it('given a setting, derives the keys from it and writes nothing', () => {
    const secret = 'x'.repeat(32);
    expect(keysOf(secret)).toEqual(keysOf(secret, join(folder, 'elsewhere')));
    expect(keysOf(secret)).not.toEqual(keysOf('y'.repeat(32)));
    expect(() => statSync(join(folder, 'secret'))).toThrow();
  });

  it('given a file that others may read, closes it to them', () => {
    keysOf(undefined);
    chmodSync(join(folder, 'secret'), 0o644);
    keysOf(undefined);
    expect(statSync(join(folder, 'secret')).mode & 0o777).toBe(0o600);
  });

  it.each(['', 'short', `${'g'.repeat(64)}\n`])(
    'given a file that holds %j, refuses it',
    (text) => {
      const file = join(folder, 'secret');
      writeFileSync(file, text);
      expect(() => keysOf(undefined)).toThrow(ConfigRefused);
      expect(() => keysOf(undefined)).toThrow('does not hold the secret');
      expect(readFileSync(file, 'utf8')).toBe(text);
    },
  );

  it('given a folder that cannot be made, says so', () => {
    writeFileSync(join(folder, 'file'), '');
    expect(() => keysOf(undefined, join(folder, 'file', 'data'))).toThrow('cannot be read or made');
  });
});
