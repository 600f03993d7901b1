import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { DEFINITIONS, DEFINITION_GROUPS } from './definitions';

const APP = path.resolve(__dirname, '../..');

/** Anchors that templates and code link to, by file. */
function linkedAnchors(folder: string): { file: string; anchor: string }[] {
  return readdirSync(folder, { withFileTypes: true, recursive: true })
    .filter((entry) => entry.isFile() && /\.(ts|html)$/.test(entry.name))
    .filter((entry) => !entry.name.endsWith('.spec.ts'))
    .flatMap((entry) => {
      const file = path.join(entry.parentPath, entry.name);
      const text = readFileSync(file, 'utf8');
      const anchors = [
        ...text.matchAll(/\bdefinition="([\w-]+)"/g),
        ...text.matchAll(/\bdefinition: '([\w-]+)'/g),
        ...text.matchAll(/<us-definition-link[^>]*?\bof="([\w-]+)"/g),
        ...text.matchAll(/how-it-is-counted#([\w-]+)/g),
      ];
      return anchors.map(([, anchor]) => ({ file: path.relative(APP, file), anchor: anchor! }));
    });
}

describe('definitions', () => {
  const ids = new Set(DEFINITIONS.map(({ id }) => id));

  it('anchors: each is there once, and none is taken by a heading of the page', () => {
    expect(ids.size).toBe(DEFINITIONS.length);
    for (const id of ids) expect(id).toMatch(/^[a-z]+(-[a-z]+)*$/);
    for (const { id } of DEFINITION_GROUPS) expect(ids.has(`group-${id}`)).toBe(false);
  });

  it('links from pages and pieces: every one leads to a definition', () => {
    const links = linkedAnchors(APP);
    expect(links.length).toBeGreaterThan(5);
    expect(links.filter(({ anchor }) => !ids.has(anchor))).toEqual([]);
  });

  it.each([
    ...[
      'margin',
      'revenue',
      'labour-cost',
      'product-cost',
      'consumables',
      'fee',
      'expected-margin',
    ],
    ...['bridge', 'weekly-chart', 'marked-weeks', 'trend', 'unbilled', 'beyond-charged', 'overrun'],
    ...['overrun-interval', 'quantiles', 'allowance', 'age-band', 'rot', 'without-cost'],
    ...['product-use', 'under-and-over', 'ratio-to-norm', 'product-temperature', 'coming-need'],
    ...['claims-counted', 'claim-rate', 'claim-free', 'log-rank', 'still-to-come'],
    ...['against-expected', 'process-risk', 'thin-product', 'warranty-report', 'warranty-left-out'],
    ...['funnel', 'side-by-side', 'branch-weeks', 'received-through', 'targets', 'signals'],
    ...['false-alarms', 'action-effect'],
    ...['small-samples', 'weeks', 'rounding', 'scope'],
  ])('a figure shown so far, %s: it is defined', (id) => {
    expect(ids).toContain(id);
  });

  it('each: says what it means in sentences and names a source', () => {
    for (const { means, source } of DEFINITIONS) {
      expect(means).toMatch(/\.$/);
      expect(means.length).toBeGreaterThan(30);
      expect(source).toMatch(/\.$/);
    }
  });
});
