import BetterSqlite3 from 'better-sqlite3';
import { rmSync } from 'node:fs';
import { recomputeAll } from '#db/recompute';
import { Store } from '#db/store';
import { TestApp } from '../support/app';
import { makeSmallNetwork, validJob } from '../support/small-network';
import { SpawnedServer } from '../support/spawned-server';

const KILLS = 5;
/** Jobs acknowledged a round before its kill may come: on a busy machine, too, there is something to have lost. */
const FEWEST = 9;
/** A few moments of a random length, so that the kill falls into reading, writing, committing and answering. */
const moment = (): Promise<void> =>
  new Promise((resolve) => setTimeout(resolve, 40 + Math.random() * 400));

let folder: string;
let key: string;
beforeAll(async () => {
  const app = await TestApp.start();
  folder = app.folder;
  key = (await makeSmallNetwork(app)).keys['AAA']!;
  await app.stop('keep');
}, 30_000);
afterAll(async () => {
  await SpawnedServer.killAll();
  rmSync(folder, { recursive: true, force: true });
});

/** Pushes jobs, singly and by tens, until the server is gone; every reference that was acknowledged, and the content. */
async function pushUntilGone(
  url: string,
  round: number,
  acknowledged: Map<string, string>,
): Promise<void> {
  const push = async (worker: number): Promise<void> => {
    const send = (path: string, method: string, body: unknown): Promise<Response> =>
      fetch(`${url}/api/branches/AAA/jobs/${path}`, {
        method,
        headers: { authorization: `Bearer ${key}`, 'content-type': 'application/json' },
        body: JSON.stringify(body),
      });
    for (let n = 0; ; n += 1) {
      const notes = `${round}-${worker}-${n}`;
      try {
        if (n % 4 === 3) {
          const jobs = Array.from({ length: 10 }, (_, at) => ({
            jobRef: `${notes}-${at}`,
            ...validJob({ notes }),
          }));
          const answer = await send('batch', 'POST', { jobs });
          if (answer.status !== 200) throw new Error(`unexpected ${answer.status}`);
          await answer.json();
          for (const { jobRef } of jobs) acknowledged.set(jobRef, notes);
        } else {
          // Every third round of a worker corrects a job that it sent before.
          const ref = n % 4 === 2 ? `${round}-${worker}-${n - 2}` : notes;
          const answer = await send(ref, 'PUT', validJob({ notes }));
          if (answer.status !== 200 && answer.status !== 201) {
            throw new Error(`unexpected ${answer.status}`);
          }
          await answer.json();
          acknowledged.set(ref, notes);
        }
      } catch (error) {
        if (error instanceof Error && error.message.startsWith('unexpected')) throw error;
        return;
      }
    }
  };
  await Promise.all(Array.from({ length: 8 }, (_, worker) => push(worker)));
}

describe('A server killed at any moment', () => {
  it('given every job that it has acknowledged, has it once and as last sent, on a sound file', async () => {
    const acknowledged = new Map<string, string>();
    for (let round = 0; round < KILLS; round += 1) {
      const server = SpawnedServer.start({ PORT: '0', UNDERSEAM_DATA: folder });
      const before = acknowledged.size;
      const pushing = pushUntilGone(await server.address(), round, acknowledged);
      while (acknowledged.size < before + FEWEST) await new Promise((turn) => setTimeout(turn, 5));
      await moment();
      await server.kill();
      await pushing;
    }
    const file = `${folder}/underseam.sqlite`;
    const store = await Store.open(folder);
    const stored = store.writing.driver
      .prepare(
        `select job_ref as ref, count(*) as times, json_extract(content, '$.notes') as notes
          from jobs join job_revisions r on r.job_id = jobs.id and r.revision = jobs.revision
          group by job_ref`,
      )
      .all() as { ref: string; times: number; notes: string }[];
    expect(recomputeAll(store)).toEqual([]);
    store.close();
    expect(stored.filter(({ times }) => times !== 1)).toEqual([]);
    const kept = new Map(stored.map(({ ref, notes }) => [ref, notes]));
    expect(acknowledged.size).toBeGreaterThanOrEqual(KILLS * FEWEST);
    for (const [ref, notes] of acknowledged) {
      // A correction may have been stored whose answer the kill cut off: then it is the one sent next.
      const [round, worker, n] = notes.split('-').map(Number);
      const allowed = [notes, `${round}-${worker}-${n! + 2}`];
      expect(allowed).toContain(kept.get(ref));
    }
    const driver = new BetterSqlite3(file, { readonly: true });
    expect(driver.pragma('integrity_check', { simple: true })).toBe('ok');
    expect(driver.pragma('foreign_key_check')).toEqual([]);
    driver.close();
  }, 120_000);
});
