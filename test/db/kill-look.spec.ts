import BetterSqlite3 from 'better-sqlite3';
import { cpSync, rmSync } from 'node:fs';
import { TestApp } from '../support/app';
import { makeSmallNetwork, validJob } from '../support/small-network';
import { SpawnedServer } from '../support/spawned-server';

/** A Monday on which all three digests are due, at an hour at which they still wait for the look. */
const NOW = '2026-02-02T09:00:00Z';

/** Moments to be killed at: as shares of what an undisturbed run takes, and as soon as a part of it is seen kept. */
const MOMENTS: readonly (number | ((seen: Parts) => boolean))[] = [
  ...[0.4, 0.7],
  ({ signals }) => signals > 0,
  ({ mails }) => mails > 0,
];

let folder: string;
beforeAll(async () => {
  const app = await TestApp.start({ now: NOW });
  folder = app.folder;
  const { office } = await makeSmallNetwork(app);
  const put = async (path: string, body: object): Promise<void> => {
    const answer = await app.call('put', `/api/branches/${path}`, { token: office, body });
    expect([path, answer.status]).toEqual([path, 201]);
  };
  const left = {
    ...{ ref: 'f', zone: 'floor', side: 'left', seenAs: 'holed', structural: true },
    action: 'deferred',
  };
  for (const branch of ['AAA', 'BBB']) {
    await put(`${branch}/jobs/rot`, validJob({ findings: [left] }));
    const mark = { status: 'open', dueOn: '2026-02-01' };
    await app.call('put', `/api/branches/${branch}/come-back/rot/f`, { token: office, body: mark });
  }
  await app.stop('keep');
}, 120_000);
afterAll(async () => {
  await SpawnedServer.killAll();
  rmSync(folder, { recursive: true, force: true });
});

/** How much there is of a look and of the digests after it. */
interface Parts {
  looks: number;
  /** What the look said that it opened. */
  said: number;
  signals: number;
  runs: string;
  /** What the runs said that they sent. */
  sent: number;
  mails: number;
}
function partsIn(data: string): Parts {
  const driver = new BetterSqlite3(`${data}/underseam.sqlite`, { readonly: true });
  const count = (text: string): number => driver.prepare(text).pluck().get() as number;
  const found = {
    looks: count('select count(*) from signal_looks'),
    said: count('select coalesce(sum(opened), 0) from signal_looks'),
    signals: count('select count(*) from signals'),
    runs: driver.prepare('select kind from digest_runs order by kind').pluck().all().join(' '),
    sent: count('select coalesce(sum(mails), 0) from digest_runs'),
    mails: count('select count(*) from mails where unsubscribe is not null'),
  };
  driver.close();
  return found;
}
const WHOLE: Parts = {
  ...{ looks: 1, said: 2, signals: 2 },
  runs: 'monday_digest month_digest region_digest',
  ...{ sent: 3, mails: 3 },
};
const start = async (data: string): Promise<SpawnedServer> => {
  const server = SpawnedServer.start({ PORT: '0', UNDERSEAM_DATA: data, UNDERSEAM_NOW: NOW });
  await server.address();
  return server;
};
const later = (milliseconds: number): Promise<void> =>
  new Promise((resolve) => setTimeout(resolve, milliseconds));
async function until(data: string, isThere: (seen: Parts) => boolean): Promise<void> {
  for (let wait = 0; wait < 6000 && !isThere(partsIn(data)); wait += 1) await later(5);
}
const isDone = ({ runs }: Parts): boolean => runs === WHOLE.runs;

/** A data folder of its own that stands as before the first look; gone with the one it was copied from. */
function freshFolder(name: string): string {
  const data = `${folder}/fresh-${name}`;
  cpSync(`${folder}/underseam.sqlite`, `${data}/underseam.sqlite`);
  return data;
}

describe('A server killed while it looks for signals and makes digests', () => {
  it('at whatever moment, has each of them whole or not at all, and one of each in the end', async () => {
    const undisturbed = freshFolder('undisturbed');
    const first = await start(undisturbed);
    const begun = performance.now();
    await until(undisturbed, isDone);
    const wholeMs = performance.now() - begun;
    await first.kill();
    expect(partsIn(undisturbed)).toEqual(WHOLE);

    for (const [n, moment] of MOMENTS.entries()) {
      const data = freshFolder(String(n));
      const server = await start(data);
      await (typeof moment === 'number' ? later(moment * wholeMs) : until(data, moment));
      await server.kill();
      const { looks, said, signals, runs, sent, mails } = partsIn(data);
      expect({ signals, mails }).toEqual({ signals: said, mails: sent });
      // No digest before the look that it tells of.
      if (looks === 0) expect(runs).toBe('');

      const again = await start(data);
      await until(data, isDone);
      // Time to make any of it twice.
      await later(500);
      await again.kill();
      expect(partsIn(data)).toEqual(WHOLE);
    }
  }, 300_000);
});
