import { existsSync, mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { openDatabase } from '#db/database';
import { runCommandLine } from '../../test/support/run-command';

/** Other programs are run here, which a busy machine may keep waiting. */
jest.setTimeout(60_000);

let folder = '';

beforeEach(async () => {
  folder = mkdtempSync(path.join(tmpdir(), 'command-'));
  (await openDatabase(path.join(folder, 'underseam.sqlite'))).close();
});
afterEach(() => rmSync(folder, { recursive: true }));

describe('npm run backup', () => {
  it('given a data folder in the environment, tells where the copy is, how large, and that it was checked', () => {
    const { code, out, error } = runCommandLine('backup', [], { UNDERSEAM_DATA: folder });
    expect(error).toBe('');
    expect(code).toBe(0);
    expect(out).toMatch(/^Backed up to .*underseam-\d+T\d+Z\.sqlite in [\d.]+ s: \d+ kB, 0 jobs/);
    expect(readdirSync(path.join(folder, 'backups'))).toHaveLength(1);
  });

  it('given an option it does not know, says so in one line and does nothing', () => {
    const { code, error } = runCommandLine('backup', ['--data', folder, '--fast']);
    expect(code).toBe(1);
    expect(error).toBe("Unknown option '--fast'.\n");
    expect(existsSync(path.join(folder, 'backups'))).toBe(false);
  });
});

describe('npm run restore', () => {
  it('given a backup and no leave, says in one line how to go on', () => {
    const file = path.join(folder, 'copy.sqlite');
    runCommandLine('backup', [file, '--data', folder]);
    const { code, error } = runCommandLine('restore', [file, '--data', folder]);
    expect(code).toBe(1);
    expect(error).toMatch(/^The folder .* holds a database already; add --move-aside .*\.\n$/);
  });

  it('given a backup and leave, restores it and tells where the former one is', () => {
    const file = path.join(folder, 'copy.sqlite');
    runCommandLine('backup', [file, '--data', folder]);
    const args = [file, '--data', folder, '--move-aside'];
    const { code, out } = runCommandLine('restore', args);
    expect(code).toBe(0);
    expect(out).toMatch(
      /^Restored .* 1 audit events; checked whole\.\nThe former database is kept in /,
    );
  });

  it('given no backup named, asks for one', () => {
    expect(runCommandLine('restore', ['--data', folder])).toEqual({
      code: 1,
      out: '',
      error: 'Name the one backup to restore: npm run restore -- FILE.\n',
    });
  });
});
