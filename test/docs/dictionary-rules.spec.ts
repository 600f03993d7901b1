import { readFileSync } from 'node:fs';
import path from 'node:path';
import { projectFiles, root } from '../support/project-files';
import { citedRules } from './cited-rules';
import { entriesOf } from './page-sections';

const SETTLED = 'shared/settled-questions.md';
const LAST_RULE = 85;
const read = (file: string): string => readFileSync(path.join(root, file), 'utf8');

const rules = entriesOf(read(SETTLED));
const numbers = rules.map(({ heading }) => Number(/^Rule (\d+): ./.exec(heading)?.[1]));

describe('the settled questions', () => {
  it('given the rules there are, hold each once, in order', () => {
    expect(numbers).toEqual(Array.from({ length: LAST_RULE }, (_, index) => index + 1));
  });

  it('given each rule, say something under it', () => {
    expect(rules.filter(({ text }) => text.length < 40)).toEqual([]);
  });

  it('given their four groups, begin each with its first rule', () => {
    const groups = [...new Set(rules.map(({ part }) => part))];
    const firsts = groups.map((group) => [
      group[0],
      numbers[rules.findIndex(({ part }) => part === group)],
    ]);
    expect(firsts).toEqual([
      ['A', 1],
      ['B', 26],
      ['C', 54],
      ['D', 71],
    ]);
  });

  it('given every file of the project, know each rule that it cites', () => {
    const written = projectFiles().filter((file) => /\.(ts|mjs|html|scss|md|json|sql)$/.test(file));
    const cited = written.flatMap((file) =>
      citedRules(read(file)).map((number) => ({ file, number })),
    );
    expect(new Set(cited.map(({ file }) => file)).size).toBeGreaterThan(50);
    expect(cited.filter(({ number }) => !numbers.includes(number))).toEqual([]);
  });
});

describe('citedRules', () => {
  it.each([
    ['see rule 3.', [3]],
    ['Rules 4 and 7', [4, 7]],
    ['rules 5, 6, and 7; rules 71–76', [5, 6, 7, 71, 76]],
    ['/** cut off (rule\n *  9) */', [9]],
    ['the rule of 8, ruler 4, rules', []],
  ])('given %j, answers %j', (text, cited) => {
    expect(citedRules(text)).toEqual(cited);
  });
});
