import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';

const FOLDER = join(__dirname, '..', '..', 'dist', 'dashboard');
/** What may be loaded before any chart is drawn, gzipped. */
const LIMIT_KB = 200;

/** Names of the scripts that a page loads at once: named in the page itself, and what those import without being asked. */
function initialScripts(): string[] {
  const page = readFileSync(join(FOLDER, 'index.html'), 'utf8');
  const found = new Set<string>();
  const follow = (name: string): void => {
    if (found.has(name)) return;
    found.add(name);
    const text = readFileSync(join(FOLDER, name), 'utf8');
    for (const [, imported] of text.matchAll(/(?:from|import)\s*"\.\/([\w-]+\.js)"/g)) {
      if (imported !== undefined) follow(imported);
    }
  };
  for (const [, name] of page.matchAll(/(?:src|href)="([\w-]+\.js)"/g)) {
    if (name !== undefined) follow(name);
  }
  return [...found];
}

describe('the first load', () => {
  it(`given the built pages, loads at most ${LIMIT_KB} kB of script before any chart`, () => {
    const scripts = initialScripts();
    expect(scripts.length).toBeGreaterThan(2);
    const bytes = scripts
      .map((name) => gzipSync(readFileSync(join(FOLDER, name))).length)
      .reduce((all, size) => all + size, 0);
    expect(bytes).toBeGreaterThan(50_000);
    expect(bytes / 1000).toBeLessThanOrEqual(LIMIT_KB);
  });

  it('given the built pages, holds no chart among what is loaded at once', () => {
    const all = initialScripts()
      .map((name) => readFileSync(join(FOLDER, name), 'utf8'))
      .join('\n');
    expect(all).not.toMatch(/us-weekly-margin-chart|us-bridge-chart|scaleLinear/);
  });
});
