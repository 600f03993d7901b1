import { sql } from '#db/database';
import { TestApp, type Answer } from '../support/app';
import { jobRows } from '../support/job-rows';
import { confirmFile, endOf, sendFile } from '../support/send-file';
import { makeSmallNetwork, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
}, 120_000);
afterAll(() => app.stop());

const send = (content: string): Promise<Answer> => sendFile(app, network.manager, { content });
const of = (id: string, tail: string): string => `/api/branches/AAA/imports/${id}${tail}`;
const ask = (method: string, path: string): Promise<Answer> =>
  app.call(method, path, { token: network.manager });
const jobsLike = (prefix: string): number =>
  app.kit.store.unscoped.first<{ n: number }>(
    sql('jobs').where('job_ref', 'like', `${prefix}-%`).count({ n: '*' }),
  )?.n ?? -1;
const trailOf = (id: string): { action: string; detail: Record<string, unknown> }[] =>
  app.kit.store.unscoped
    .all<{ action: string; detail: string }>(
      sql('audit_events').where('subject', `/branches/AAA/imports/${id}`).orderBy('id'),
    )
    .map(({ action, detail }) => ({
      action,
      detail: JSON.parse(detail) as Record<string, unknown>,
    }));

describe('The writing of a file', () => {
  it('given 20,000 rows, answers others meanwhile, tells how far it is and what it did', async () => {
    const sent = await send(jobRows(20_000, 'many'));
    expect(sent.body.counts).toMatchObject({ rows: 20_000, new: 20_000, refused: 0 });
    expect((await ask('post', of(sent.body.id, '/confirm'))).body).toMatchObject({
      state: 'writing',
      progress: { of: 20_000 },
    });
    const seen: number[] = [];
    for (;;) {
      const { body } = await ask('get', of(sent.body.id, ''));
      if (body.state !== 'writing') break;
      seen.push(body.progress.done);
      await new Promise((resolve) => setTimeout(resolve, 50));
    }
    expect(new Set(seen).size).toBeGreaterThan(3);
    expect(seen).toEqual([...seen].sort((a, b) => a - b));
    const { body } = await ask('get', of(sent.body.id, ''));
    expect(body).toMatchObject({
      state: 'done',
      progress: { done: 20_000, of: 20_000 },
      written: { created: 20_000, replaced: 0, unchanged: 0, refused: 0 },
    });
    expect(jobsLike('many')).toBe(20_000);
    const [begin, end] = trailOf(sent.body.id);
    expect([begin?.action, end?.action]).toEqual(['import.write', 'import.end']);
    expect(end?.detail).toMatchObject({ state: 'done', written: { created: 20_000 } });
  }, 300_000);

  it('given a cancel, keeps what is written, says so, and goes on when confirmed again', async () => {
    const sent = await send(jobRows(6000, 'cut'));
    const { id } = sent.body;
    await ask('post', of(id, '/confirm'));
    const busy = await ask('put', of(id, ''));
    expect(busy.status).toBe(400);
    while ((await ask('get', of(id, ''))).body.progress.done === 0);
    const { body } = await ask('post', of(id, '/cancel'));
    expect(body.state).toBe('cancelled');
    const done = body.written.created as number;
    expect(done).toBeGreaterThan(0);
    expect(done).toBeLessThan(6000);
    expect([body.progress.done, jobsLike('cut')]).toEqual([done, done]);
    const again = await confirmFile(app, network.manager, id);
    expect(again.body).toMatchObject({ state: 'done', written: { created: 6000, unchanged: 0 } });
    expect(jobsLike('cut')).toBe(6000);
  }, 300_000);

  it('given a cancel before it is confirmed, writes nothing and may still be confirmed', async () => {
    const sent = await send(jobRows(3, 'held'));
    const { body } = await ask('post', of(sent.body.id, '/cancel'));
    expect([body.state, jobsLike('held')]).toEqual(['cancelled', 0]);
    expect((await confirmFile(app, network.manager, sent.body.id)).body.state).toBe('done');
  });

  it('given a row whose job was changed meanwhile, judges it as things stand when it is written', async () => {
    const sent = await send(jobRows(1, 'late'));
    await confirmFile(app, network.manager, (await send(jobRows(1, 'late', 99))).body.id);
    const { body } = await confirmFile(app, network.manager, sent.body.id);
    expect(body).toMatchObject({ counts: { new: 1 }, written: { created: 0, replaced: 1 } });
  });

  it('given two files at once, writes one after the other', async () => {
    const [one, two] = await Promise.all([send(jobRows(400, 'one')), send(jobRows(400, 'two'))]);
    await Promise.all([one, two].map(({ body }) => ask('post', of(body.id, '/confirm'))));
    for (const { body } of [one, two]) {
      const ended = await endOf(app, network.manager, body.id);
      expect(ended.body).toMatchObject({ state: 'done', written: { created: 400 } });
    }
  }, 120_000);
});
