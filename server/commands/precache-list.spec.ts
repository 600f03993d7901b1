import { mkdirSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { askModule } from '../../test/support/ask-module';
import { root } from '../../test/support/project-files';

const folder = path.join(root, 'test/output/precache-list');
const write = (name: string, text: string): void => writeFileSync(path.join(folder, name), text);
const list = (): { url: string; revision: string | null }[] =>
  askModule(path.join(__dirname, 'precache-list.mjs'), 'precacheList', [folder]) as {
    url: string;
    revision: string | null;
  }[];

beforeEach(() => {
  rmSync(folder, { recursive: true, force: true });
  mkdirSync(path.join(folder, 'icons'), { recursive: true });
  write('index.html', '<html></html>');
  write('main-ABCDEF12.js', 'one');
  write('mark.svg', '<svg/>');
  write('icons/icon-192.png', 'png');
  write('3rdpartylicenses.txt', 'words');
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

describe('precacheList', () => {
  it('given built pages, names the page and every file it needs, and no other', () => {
    expect(list().map(({ url }) => url)).toEqual([
      '/',
      '/icons/icon-192.png',
      '/main-ABCDEF12.js',
      '/mark.svg',
    ]);
  });

  it('given a name with a hash, asks for no revision beside it', () => {
    expect(list().find(({ url }) => url === '/main-ABCDEF12.js')?.revision).toBeNull();
  });

  it.each([
    ['the page', 'index.html', '/'],
    ['a file without a hash', 'mark.svg', '/mark.svg'],
  ])('given %s changed, gives it another revision', (_what, file, url) => {
    const before = list().find((one) => one.url === url)?.revision;
    write(file, 'changed');
    const after = list().find((one) => one.url === url)?.revision;
    expect(before).toMatch(/^[0-9a-f]{16}$/);
    expect(after).not.toBe(before);
  });
});
