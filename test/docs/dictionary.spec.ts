import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import * as vocabulary from '#shared/domain/vocabulary';
import { DEFINITIONS } from '../../projects/dashboard/src/app/features/how-it-is-counted/definitions';
import { MADE_BY_RUNNING, root } from '../support/project-files';
import { isThere, namedIn } from './named-paths';
import { codeIn, entriesOf } from './page-sections';

const DICTIONARY = 'shared/dictionary.md';
const SETTLED = 'shared/settled-questions.md';
const read = (file: string): string => readFileSync(path.join(root, file), 'utf8');

const lists: [string, readonly string[]][] = Object.entries(vocabulary);
const figures = DEFINITIONS.map(({ id }) => id);
const entries = entriesOf(read(DICTIONARY));
const marks = entries.flatMap((entry) => entry.marks);
const numbers = entries.filter(({ part }) => part.startsWith('Numbers: '));
const methods = entries.filter(({ part }) => part === 'Methods');

describe('the dictionary', () => {
  it.each(lists)(
    'given the list %s, tells all its words in order under its name',
    (name, words) => {
      const told = entries.filter((entry) => entry.marks.includes(name));
      expect(told).toHaveLength(1);
      const codes = codeIn(told[0]?.text ?? '').filter((code) => words.includes(code));
      expect([...new Set(codes)]).toEqual(words);
    },
  );

  it.each(figures)('given the figure %s of How it is counted, has one entry for it', (id) => {
    expect(marks.filter((mark) => mark === id)).toEqual([id]);
  });

  it('given the names in its headings, has none that is neither a list nor a figure', () => {
    const known = [...lists.map(([name]) => name), ...figures];
    expect(marks.filter((mark) => !known.includes(mark))).toEqual([]);
  });

  it.each(numbers)(
    'given $heading, says what it is, its formula, what is left out, its source',
    (number) => {
      const parts = /^[A-Z][^]{10,}\n\n- Formula: .{5}[^]*\n- Left out: .{5}[^]*\n- Source: .{3}/;
      expect(number.text).toMatch(parts);
    },
  );

  it.each(methods)('given the method $heading, names its source', ({ text }) => {
    expect(text).toMatch(/ Source:\s+[^]{10,}\.$/);
  });

  it('given its links within the page, leads to headings', () => {
    const anchors = [...read(DICTIONARY).matchAll(/\]\(#([^)]+)\)/g)].map((link) => link[1]);
    expect(anchors).not.toEqual([]);
    const parts = entries.map(({ part }) => part.toLowerCase());
    expect(anchors.filter((anchor) => !parts.includes(anchor ?? ''))).toEqual([]);
  });
});

describe('the dictionary and the settled questions', () => {
  const folders = readdirSync(root, { withFileTypes: true })
    .filter((entry) => entry.isDirectory() && !MADE_BY_RUNNING.includes(entry.name))
    .map((entry) => entry.name);

  it.each([DICTIONARY, SETTLED])('given the files that %s names, name only what exists', (page) => {
    const names = namedIn(read(page), page, folders).map(({ name }) => name);
    expect(names).toContain('shared/domain/vocabulary.ts');
    expect(names.filter((name) => !isThere(name, root))).toEqual([]);
  });
});
