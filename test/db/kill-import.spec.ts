import { rmSync } from 'node:fs';
import { recomputeAll } from '#db/recompute';
import { Store } from '#db/store';
import { PASSWORD, TestApp, type Answer } from '../support/app';
import { jobRows } from '../support/job-rows';
import { endOf, sendFile } from '../support/send-file';
import { readAnswer } from '../support/read-answer';
import { makeSmallNetwork } from '../support/small-network';
import { SpawnedServer } from '../support/spawned-server';

const ROWS = 4000;
let folder: string;
let id: string;
beforeAll(async () => {
  const app = await TestApp.start();
  folder = app.folder;
  const { manager } = await makeSmallNetwork(app);
  id = ((await sendFile(app, manager, { content: jobRows(ROWS, 'k') })).body as { id: string }).id;
  await app.stop('keep');
}, 120_000);
afterAll(async () => {
  await SpawnedServer.killAll();
  rmSync(folder, { recursive: true, force: true });
});

/** Asks a server in a process of its own, as the branch's manager. */
async function asking(url: string): Promise<(method: string, tail?: string) => Promise<Answer>> {
  const call = async (
    method: string,
    path: string,
    token?: string,
    body?: unknown,
  ): Promise<Answer> => {
    const response = await fetch(url + path, {
      method,
      headers: {
        ...(token !== undefined && { authorization: `Bearer ${token}` }),
        ...(body !== undefined && { 'content-type': 'application/json' }),
      },
      ...(body !== undefined && { body: JSON.stringify(body) }),
    });
    return readAnswer(response);
  };
  const signedIn = await call('POST', '/api/auth/sign-in', undefined, {
    email: 'manager@network.example',
    password: PASSWORD,
  });
  const { accessToken } = signedIn.body as { accessToken: string };
  return (method, tail = '') => call(method, `/api/branches/AAA/imports/${id}${tail}`, accessToken);
}

describe('A server killed while it writes a file', () => {
  it('given another start, tells exactly what was written and goes on when confirmed again', async () => {
    const settings = { PORT: '0', UNDERSEAM_DATA: folder, UNDERSEAM_NOW: '2026-02-02T06:30:00Z' };
    let before = 0;
    for (let round = 0; round < 2; round += 1) {
      const server = SpawnedServer.start(settings);
      const ask = await asking(await server.address());
      if (round > 0) {
        const { body } = await ask('GET');
        expect(body.state).toBe('stopped');
        expect(body.written.created).toBe(body.progress.done);
        expect(body.progress.done).toBeGreaterThanOrEqual(before);
      }
      expect((await ask('POST', '/confirm')).status).toBe(202);
      do before = (await ask('GET')).body.progress.done as number;
      while (before < (round + 1) * 200);
      await server.kill();
    }
    const app = await TestApp.start({ folder });
    const token = (
      await app.call('post', '/api/auth/sign-in', {
        body: { email: 'manager@network.example', password: PASSWORD },
      })
    ).body.accessToken as string;
    const path = `/api/branches/AAA/imports/${id}`;
    const stopped = await app.call('get', path, { token });
    expect(stopped.body).toMatchObject({ state: 'stopped', endedAt: expect.any(String) });
    const stored = app.kit.store.unscoped
      .prepare(`select count(*) as n from jobs where job_ref like 'k-%'`)
      .get() as { n: number };
    expect(stopped.body.written).toEqual({
      created: stored.n,
      replaced: 0,
      unchanged: 0,
      refused: 0,
    });
    expect(stored.n).toBeLessThan(ROWS);
    await app.call('post', `${path}/confirm`, { token });
    const { body } = await endOf(app, token, id);
    expect(body).toMatchObject({ state: 'done', written: { created: ROWS, unchanged: 0 } });
    await app.stop('keep');
    const store = await Store.open(folder);
    expect(recomputeAll(store)).toEqual([]);
    store.close();
  }, 300_000);
});
