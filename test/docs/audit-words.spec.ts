import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import {
  ACTION_WORDS,
  actionWords,
} from '../../projects/dashboard/src/app/features/audit/action-words';

const root = path.resolve(__dirname, '../..');

/** Files that write to the audit trail: they record an event, or hand an action to what does. */
function recorders(): string[] {
  return ['db', 'server', 'seeds'].flatMap((folder) =>
    readdirSync(path.join(root, folder), { recursive: true, encoding: 'utf8' })
      .filter((file) => file.endsWith('.ts') && !file.endsWith('.spec.ts'))
      .map((file) => readFileSync(path.join(root, folder, file), 'utf8'))
      .filter((text) => /recordAudit\(|changeCatalogue\(|\.(?:tell|audit)\(/.test(text)),
  );
}

/** Every `thing.verb` that stands whole in those files. */
function actionsInSource(): string[] {
  const found = recorders().flatMap((text) =>
    [...text.matchAll(/'([a-z]+(?:-[a-z]+)*\.[a-z]+(?:-[a-z]+)*)'/g)].map(([, code]) => code ?? ''),
  );
  return [...new Set(found)].sort();
}

describe('words of the audit trail', () => {
  it('given the source, finds the actions it is known to write', () => {
    expect(actionsInSource()).toEqual(
      expect.arrayContaining(['job.void', 'claim.make', 'region.set', 'sign-in.end-all']),
    );
  });

  it('given every action in the source, has words for each', () => {
    expect(actionsInSource().filter((code) => !Object.hasOwn(ACTION_WORDS, code))).toEqual([]);
  });

  it('given an action put together while running, has words for what it can become', () => {
    for (const code of ['cost.set', 'norm.set']) expect(Object.keys(ACTION_WORDS)).toContain(code);
    expect(actionWords('export.rot-zones')).toBe('fetched a file of rows: rot zones');
  });

  it('given an action of tomorrow, says its code in words', () => {
    expect(actionWords('thing-of-tomorrow.made-new')).toBe('thing of tomorrow: made new');
    expect(actionWords('constructor')).toBe('constructor');
  });
});
