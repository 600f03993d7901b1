import { chmodSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { askModule } from './ask-module';

const finder = path.join(__dirname, 'find-chromium.mjs');
let folder = '';

beforeEach(() => {
  folder = mkdtempSync(path.join(tmpdir(), 'chromium-'));
});
afterEach(() => rmSync(folder, { recursive: true }));

function place(name: string, mode: number): string {
  const file = path.join(folder, name);
  writeFileSync(file, '');
  chmodSync(file, mode);
  return file;
}

const find = (env: object, places: string[] = []): unknown =>
  askModule(finder, 'findChromium', [env, places]);

describe('findChromium', () => {
  it('given CHROME, answers it', () => {
    const chrome = place('own-browser', 0o755);
    expect(find({ CHROME: chrome })).toBe(chrome);
  });

  it('given a CHROME that is not there, looks no further', () => {
    place('chromium', 0o755);
    expect(find({ CHROME: path.join(folder, 'gone'), PATH: folder })).toBeNull();
  });

  it('given a browser on the search path, answers it', () => {
    expect(find({ PATH: folder })).toBeNull();
    const chromium = place('chromium', 0o755);
    expect(find({ PATH: `${path.join(folder, 'none')}${path.delimiter}${folder}` })).toBe(chromium);
  });

  it('given only a usual place, answers it', () => {
    const chromium = place('usual', 0o755);
    expect(find({ PATH: '' }, [chromium])).toBe(chromium);
  });

  it('given a folder of that name, passes over it', () => {
    expect(find({ PATH: '' }, [folder])).toBeNull();
  });
});

describe('canInstallChromium', () => {
  it.each([
    ['ID=debian\n', 0, true],
    ['PRETTY_NAME="Debian"\nID=debian\nVERSION_ID="12"\n', 0, true],
    ['ID=debian\n', 1000, false],
    ['ID=ubuntu\nID_LIKE=debian\n', 0, false],
    ['', 0, false],
  ])('given release %j and user %d, answers %s', (release, user, expected) => {
    expect(askModule(finder, 'canInstallChromium', [release, user])).toBe(expected);
  });
});
