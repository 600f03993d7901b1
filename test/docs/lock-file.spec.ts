import { readFileSync } from 'node:fs';
import path from 'node:path';
import { projectFiles, root } from '../support/project-files';

const read = (file: string): string => readFileSync(path.join(root, file), 'utf8');

interface Lock {
  packages: Record<string, { resolved?: string; hasInstallScript?: boolean }>;
}

describe('package-lock.json', () => {
  const { packages } = JSON.parse(read('package-lock.json')) as Lock;

  it('given any package, names no place it was downloaded from', () => {
    const named = Object.entries(packages).filter(([, { resolved }]) => resolved !== undefined);
    expect(named).toEqual([]);
  });

  it('given a package with an install script, has a decision about it in package.json', () => {
    const { allowScripts } = JSON.parse(read('package.json')) as {
      allowScripts: Record<string, boolean>;
    };
    const withScript = Object.entries(packages)
      .filter(([, { hasInstallScript }]) => hasInstallScript)
      .map(([name]) => name.replace(/^.*node_modules\//, ''));
    expect(withScript).not.toEqual([]);
    for (const name of withScript) expect(Object.keys(allowScripts)).toContain(name);
  });
});

describe('the project', () => {
  it('given any of its files, names no package registry and no folder of a developer’s machine', () => {
    // Written in pieces, so that this file does not name them either.
    const banned = ['registry.' + 'npmjs', 'registry.' + 'yarnpkg', '/tmp' + '/', '/work' + '/'];
    const found = projectFiles().flatMap((file) => {
      const text = read(file);
      return banned.filter((word) => text.includes(word)).map((word) => `${file}: ${word}`);
    });
    expect(found).toEqual([]);
  });
});
