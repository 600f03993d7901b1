import BetterSqlite3 from 'better-sqlite3';
import { parse } from 'csv-parse/sync';
import { copyFileSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { inspectAudit } from '#db/copy-database';
import { PASSWORD, TestApp, type Answer } from '../support/app';
import { runCommandLine } from '../support/run-command';
import { makeSmallNetwork, type SmallNetwork } from '../support/small-network';

jest.setTimeout(60_000);

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
});
afterAll(() => app.stop());

const get = (path: string): Promise<Answer> => app.call('get', path, { token: network.office });
const readRecords = (text: string): Record<string, string>[] => parse(text, { columns: true });

describe('The chain of the trail', () => {
  it('given a trail that nobody touched, says how many events and the last hash', async () => {
    const { body } = await get('/api/audit/check');
    // The export is itself an event: the one before it was the last when the check ran.
    const rows = readRecords((await get('/api/exports/audit.csv')).text);
    expect(body).toEqual({
      events: Number(rows[1]?.['id']),
      since: rows.at(-1)?.['at'],
      brokenAt: null,
      lastHash: rows[1]?.['hash'],
      checkedAt: expect.stringMatching(/Z$/) as string,
    });
  });

  describe('given a copy in which somebody changed a row behind its back', () => {
    let folder: string;
    let file: string;
    beforeEach(() => {
      folder = mkdtempSync(join(tmpdir(), 'underseam-tampered-'));
      file = join(folder, 'underseam.sqlite');
      app.kit.store.tidy();
      copyFileSync(app.kit.store.file, file);
    });
    afterEach(() => rmSync(folder, { recursive: true }));

    const tamper = (statement: string): void => {
      const driver = new BetterSqlite3(file);
      for (const change of ['update', 'delete', 'replace']) {
        driver.exec(`drop trigger audit_events_no_${change}`);
      }
      driver.exec(statement);
      driver.close();
    };

    it.each([
      ['another detail', "update audit_events set detail = '{}' where id = 12", 12],
      ['an event taken out', 'delete from audit_events where id = 20', 21],
      ['another time', "update audit_events set at = '2020-01-01' where id = 5", 5],
    ])('%s, names the first event that does not fit', (_, statement, id) => {
      tamper(statement);
      expect(() => inspectAudit(file)).toThrow(`event ${id} does not follow`);
    });

    it('another actor, says so on the page and by the command', async () => {
      tamper("update audit_events set actor = 'nobody' where id = 9");
      const other = await TestApp.start({ folder });
      try {
        const given = { email: 'office@network.example', password: PASSWORD };
        const signedIn = await other.call('post', '/api/auth/sign-in', { body: given });
        const { accessToken: token } = signedIn.body as { accessToken: string };
        const { body } = await other.call('get', '/api/audit/check', { token });
        expect([body.events, body.brokenAt]).toEqual([8, 9]);
      } finally {
        await other.stop('keep');
      }
      const { code, out, error } = runCommandLine('audit-check', ['--data', folder]);
      expect([code, out]).toEqual([1, '']);
      expect(error).toMatch(
        /^The audit trail of .* does not hold: event 9 does not follow .*\.\n$/,
      );
    });

    it('nothing changed, says by the command that it holds and what to write down', () => {
      const { code, out, error } = runCommandLine('audit-check', ['--data', folder]);
      expect([code, error]).toEqual([0, '']);
      expect(out).toMatch(
        /^The audit trail holds: \d+ events since \d{4}-\d\d-\d\d; the last hash is [0-9a-f]{64}\.\n$/,
      );
    });
  });
});
