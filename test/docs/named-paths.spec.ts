import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { MADE_BY_RUNNING, projectFiles, root } from '../support/project-files';
import { isThere, namedIn } from './named-paths';

const folders = readdirSync(root, { withFileTypes: true })
  .filter((entry) => entry.isDirectory() && !MADE_BY_RUNNING.includes(entry.name))
  .map((entry) => entry.name);
const { scripts } = JSON.parse(readFileSync(path.join(root, 'package.json'), 'utf8')) as {
  scripts: Record<string, string>;
};
const documents = projectFiles().filter((file) => file.endsWith('.md'));

describe('the documents', () => {
  it.each(['README.md', 'DEVELOPERS.md'])('given a newcomer, include %s', (file) => {
    expect(documents).toContain(file);
  });

  it.each(documents)('given what %s names, name only what exists', (file) => {
    const named = namedIn(readFileSync(path.join(root, file), 'utf8'), file, folders);
    const missing = named.filter(({ kind, name }) =>
      kind === 'script' ? !(name in scripts) : !isThere(name, root),
    );
    expect(missing).toEqual([]);
  });
});

describe('namedIn', () => {
  const named = (markdown: string): string[] =>
    namedIn(markdown, 'notes/guide.md', ['db', 'server']).map(({ name }) => name);

  it('given links and pictures, answers their targets from the root', () => {
    expect(named('[a](../db/scope.ts) ![b](pictures/week.png) <img src="x.png">')).toEqual([
      'db/scope.ts',
      'notes/pictures/week.png',
      'notes/x.png',
    ]);
  });

  it('given links to elsewhere, leaves them out', () => {
    expect(named('[a](#part) [b](mailto:a@example.org) [c](/api/docs)')).toEqual([]);
  });

  it('given code, answers the words that begin with a folder or an alias', () => {
    expect(
      named('see `db/scope.ts`, `#server/app` and `npm run check`\n```\nnode server/x.mjs\n```'),
    ).toEqual(['server/x.mjs', 'db/scope.ts', 'server/app', 'check']);
  });

  it('given paths that running makes, leaves them out', () => {
    expect(namedIn('`dist/server/main.js`', 'a.md', ['dist'])).toEqual([]);
  });
});

describe('isThere', () => {
  it.each([
    'test/docs',
    'test/docs/named-paths.ts',
    'test/docs/named-paths',
    'test/<any>/named-*.ts',
  ])('given %s, finds it', (name) => {
    expect(isThere(name, root)).toBe(true);
  });

  it.each(['test/docs/no-such-file.ts', 'no-such-folder/a.ts', 'test/*/no-such-*.ts'])(
    'given %s, misses it',
    (name) => {
      expect(isThere(name, root)).toBe(false);
    },
  );
});
