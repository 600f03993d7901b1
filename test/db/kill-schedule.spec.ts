import BetterSqlite3 from 'better-sqlite3';
import { rmSync } from 'node:fs';
import { sql } from '#db/database';
import { TestApp } from '../support/app';
import { makeSmallNetwork, validJob } from '../support/small-network';
import { SpawnedServer } from '../support/spawned-server';

/** After the server says that it serves: before the report is begun, while it is made, about when it is kept. */
const KILLS_AFTER_MS = [0, 300, 1200, 2500];
const NOW = '2026-02-05T09:00:00Z';

let folder: string;
beforeAll(async () => {
  const app = await TestApp.start({ now: NOW });
  folder = app.folder;
  const { office, manager } = await makeSmallNetwork(app);
  await app.call('put', '/api/branches/AAA/jobs/a', { token: manager, body: validJob() });
  await app.signIn('second@network.example', 'head_office');
  const people = app.kit.store.unscoped
    .all<{ id: number }>(sql('people').where({ role: 'head_office' }).select('id'))
    .map(({ id }) => id);
  const body = { active: true, dayOfMonth: 5, people };
  await app.call('put', '/api/warranty-schedule', { token: office, body });
  await app.stop('keep');
}, 120_000);
afterAll(async () => {
  await SpawnedServer.killAll();
  rmSync(folder, { recursive: true, force: true });
});

/** How many there are of each part of a run. */
function parts(): { reports: number; runs: number; mails: number; told: number } {
  const driver = new BetterSqlite3(`${folder}/underseam.sqlite`, { readonly: true });
  const count = (text: string): number => driver.prepare(text).pluck().get() as number;
  const found = {
    reports: count('select count(*) from warranty_reports'),
    runs: count('select count(*) from warranty_runs'),
    mails: count(`select count(*) from mails where report_run = '2026-02'`),
    told: count(`select count(*) from audit_events where action = 'warranty-report.issue'`),
  };
  driver.close();
  return found;
}
const NONE = { reports: 0, runs: 0, mails: 0, told: 0 };
const WHOLE = { reports: 1, runs: 1, mails: 2, told: 1 };
const start = (): SpawnedServer =>
  SpawnedServer.start({ PORT: '0', UNDERSEAM_DATA: folder, UNDERSEAM_NOW: NOW });
const later = (milliseconds: number): Promise<void> =>
  new Promise((resolve) => setTimeout(resolve, milliseconds));

describe('A server killed while it issues the report of the month', () => {
  it('at whatever moment, has report, run and mails together or none of them, and one of each in the end', async () => {
    for (const afterMs of KILLS_AFTER_MS) {
      const server = start();
      await server.address();
      await later(afterMs);
      await server.kill();
      expect([NONE, WHOLE]).toContainEqual(parts());
    }
    const server = start();
    await server.address();
    for (let wait = 0; wait < 600 && parts().runs === 0; wait += 1) await later(100);
    await server.stop();
    expect(parts()).toEqual(WHOLE);
    const again = start();
    await again.address();
    await later(1000);
    await again.kill();
    expect(parts()).toEqual(WHOLE);
  }, 300_000);
});
