import { spawnSync } from 'node:child_process';
import path from 'node:path';
import { SNIPPETS } from './snippets';

interface Finding {
  ruleId: string | null;
  message: string;
}

describe('the lint rules', () => {
  let answers: Finding[][] = [];

  beforeAll(() => {
    const root = path.join(__dirname, '../..');
    const run = spawnSync(process.execPath, [path.join(__dirname, 'lint-snippets.mjs')], {
      cwd: root,
      input: JSON.stringify(SNIPPETS),
      encoding: 'utf8',
    });
    if (run.status !== 0) throw new Error(run.stderr);
    answers = JSON.parse(run.stdout) as Finding[][];
  }, 120_000);

  it.each(SNIPPETS.map((snippet, at) => ({ ...snippet, at, verdict: snippet.rule ?? 'nothing' })))(
    'given $what, answer with $verdict',
    ({ at, rule }) => {
      const found = answers[at]?.map(({ ruleId }) => ruleId);
      if (rule) expect(found).toContain(rule);
      else expect(found).toEqual([]);
    },
  );

  it('given a broken arrow, say in a sentence what to do instead', () => {
    const broken = answers.flat().filter(({ ruleId }) => ruleId === 'underseam/arrows');
    expect(broken.length).toBeGreaterThan(30);
    for (const { message } of broken) expect(message).toMatch(/ .*\.$/);
  });
});
