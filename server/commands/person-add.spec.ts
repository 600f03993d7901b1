import { existsSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { findLogin, findPerson } from '#db/queries/people';
import { verifyAudit } from '#db/queries/audit';
import { Store } from '#db/store';
import { runCommandLine, type Ended } from '../../test/support/run-command';
import { PasswordThread } from '../workers/password-thread';

/** Other programs are run here, which a busy machine may keep waiting. */
jest.setTimeout(60_000);

const PASSWORD = 'a password nobody else has';
let data = '';

beforeEach(() => {
  data = path.join(mkdtempSync(path.join(tmpdir(), 'person-')), 'data');
});
afterEach(() => rmSync(path.dirname(data), { recursive: true }));

const personAdd = (args: readonly string[], password = PASSWORD): Ended =>
  runCommandLine('person-add', args, { UNDERSEAM_DATA: data, UNDERSEAM_PASSWORD: password });

const HEAD = ['--email', 'head@example.org', '--name', 'Head One', '--role', 'head_office'];

describe('npm run person:add', () => {
  it('given an empty network, makes its first person, who can sign in with the password', async () => {
    expect(personAdd(HEAD)).toEqual({
      code: 0,
      out: 'Added Head One (head@example.org) as head office.\n',
      error: '',
    });
    const store = await Store.open(data);
    const passwords = new PasswordThread();
    try {
      const login = findLogin(store.unscoped, 'HEAD@example.org');
      expect(await passwords.matches(PASSWORD, login?.passwordHash ?? null)).toBe(true);
      expect(verifyAudit(store.unscoped)).toMatchObject({ brokenAt: null });
    } finally {
      await passwords.close();
      store.close();
    }
  });

  it('given a server that has the data folder open, adds the person beside it', async () => {
    const store = await Store.open(data);
    try {
      expect(personAdd(HEAD)).toMatchObject({ code: 0 });
      const login = findLogin(store.unscoped, 'head@example.org');
      expect(findPerson(store.unscoped, login?.id ?? 0)).toMatchObject({ role: 'head_office' });
    } finally {
      store.close();
    }
  });

  it('given an address that somebody has, says so', () => {
    personAdd(HEAD);
    expect(personAdd(HEAD)).toMatchObject({
      code: 1,
      error: 'Somebody already signs in with this e-mail address.\n',
    });
  });

  it('given a branch that is not there, names the option', () => {
    const args = ['--email', 'r@example.org', '--name', 'R', '--role', 'recorder'];
    const { code, error } = personAdd([...args, '--branch', 'NONE']);
    expect(code).toBe(1);
    expect(error).toContain('--branch: there is no branch with the code "NONE"');
  });

  it('given several mistakes, names all of them and makes no data folder', () => {
    const { code, error } = personAdd(['--email', 'nowhere', '--role', 'boss'], 'short');
    expect(code).toBe(1);
    for (const option of ['--email:', '--name:', '--role:', 'UNDERSEAM_PASSWORD:']) {
      expect(error).toContain(option);
    }
    expect(existsSync(data)).toBe(false);
  });

  it('given no password, asks for one and makes no data folder', () => {
    const { code, error } = personAdd(HEAD, '');
    expect(code).toBe(1);
    expect(error).toMatch(/^Set UNDERSEAM_PASSWORD .*\.\n$/);
    expect(existsSync(data)).toBe(false);
  });
});
