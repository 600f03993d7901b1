import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { askModule } from '../../test/support/ask-module';
import { root } from '../../test/support/project-files';

/** Other programs are run here, which a busy machine may keep waiting. */
jest.setTimeout(60_000);

const folder = 'test/output/build-product';
const at = (name: string): string => path.join(root, folder, name);
const part = {
  sources: [`${folder}/sources`],
  results: [`${folder}/out`],
  entry: `${folder}/out/main.js`,
  command: [at('build.mjs')],
};

const build = (): { built: boolean; code: number } =>
  askModule(path.join(__dirname, 'build-product.mjs'), 'buildIfNeeded', [part]) as {
    built: boolean;
    code: number;
  };

beforeEach(() => {
  rmSync(at(''), { recursive: true, force: true });
  mkdirSync(at('sources/inner'), { recursive: true });
  writeFileSync(at('sources/a.ts'), 'one');
  writeFileSync(at('sources/inner/b.ts'), 'two');
  writeFileSync(
    at('build.mjs'),
    `import { mkdirSync, writeFileSync, readFileSync } from 'node:fs';
     if (readFileSync(${JSON.stringify(at('sources/a.ts'))}, 'utf8') === 'broken') process.exit(3);
     mkdirSync(${JSON.stringify(at('out'))}, { recursive: true });
     writeFileSync(${JSON.stringify(at('out/main.js'))}, 'built');`,
  );
});
afterAll(() => rmSync(at(''), { recursive: true, force: true }));

describe('buildIfNeeded', () => {
  it('given nothing built yet, builds, and not again', () => {
    expect(build()).toMatchObject({ built: true, code: 0 });
    expect(readFileSync(at('out/main.js'), 'utf8')).toBe('built');
    expect(build()).toMatchObject({ built: false, code: 0 });
  });

  it.each<[what: string, change: () => void]>([
    ['changed', () => writeFileSync(at('sources/inner/b.ts'), 'three')],
    ['added', () => writeFileSync(at('sources/c.ts'), '')],
    ['removed', () => rmSync(at('sources/inner/b.ts'))],
  ])('given a source %s, builds again', (_what, change) => {
    build();
    change();
    expect(build().built).toBe(true);
  });

  it('given only a spec changed, does not build', () => {
    build();
    writeFileSync(at('sources/a.spec.ts'), 'a test');
    expect(build().built).toBe(false);
  });

  it('given what was built has gone, builds again', () => {
    build();
    rmSync(at('out'), { recursive: true });
    expect(build().built).toBe(true);
  });

  it('given something left by a removed source, clears it away', () => {
    build();
    writeFileSync(at('out/old.js'), '');
    writeFileSync(at('sources/a.ts'), 'newer');
    build();
    expect(existsSync(at('out/old.js'))).toBe(false);
  });

  it('given a build that fails, says so each time', () => {
    writeFileSync(at('sources/a.ts'), 'broken');
    expect(build()).toMatchObject({ built: true, code: 3 });
    expect(build()).toMatchObject({ built: true, code: 3 });
  });
});
