import { TestApp, type Answer } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
});
afterAll(() => app.stop());

let next = 0;
const job = (ref: string): string => `/api/branches/AAA/jobs/${ref}`;
const claim = (ref: string): string => `/api/branches/AAA/claims/${ref}`;
const key = (): string | undefined => network.keys['AAA'];
const call = (
  method: string,
  path: string,
  token: string | undefined,
  body?: unknown,
): Promise<Answer> => app.call(method, path, { token, ...(body !== undefined && { body }) });
const voidIt = (ref: string): Promise<Answer> => call('delete', job(ref), network.manager);
async function stored(): Promise<string> {
  const ref = `void-${(next += 1)}`;
  expect((await call('put', job(ref), key(), validJob())).status).toBe(201);
  return ref;
}
const billed = async (): Promise<number> => {
  const path = '/api/analytics/margin?from=2026-01-26&to=2026-02-01&branch=AAA';
  return (await call('get', path, network.manager)).body.weeks[0].revenueCents as number;
};

describe('DELETE of a job (rule 25)', () => {
  it('given a job, voids it: 204 without a body, then 404', async () => {
    const ref = await stored();
    const first = await voidIt(ref);
    expect([first.status, first.text]).toEqual([204, '']);
    expect((await voidIt(ref)).status).toBe(404);
    expect((await voidIt('never-there')).status).toBe(404);
    expect((await call('get', job(ref), network.manager)).status).toBe(404);
  });

  it('given a voided job, counts it nowhere', async () => {
    const before = await billed();
    const ref = await stored();
    expect(await billed()).toBe(before + 87_000);
    await voidIt(ref);
    expect(await billed()).toBe(before);
    const list = await call('get', `/api/jobs?q=${ref}`, network.manager);
    expect(list.body.items).toEqual([]);
  });

  it('given a voided job, keeps it and who voided it in the record', async () => {
    const ref = await stored();
    await voidIt(ref);
    const events = app.kit.store.unscoped
      .prepare('select actor, action, detail from audit_events where subject = ? order by id')
      .all(`/branches/AAA/jobs/${ref}`) as { actor: string; action: string; detail: string }[];
    expect(events).toMatchObject([{ actor: 'manager@network.example', action: 'job.void' }]);
    expect(JSON.parse(events[0]!.detail).before).toMatchObject({ completedOn: '2026-01-28' });
    const kept = app.kit.store.unscoped
      .prepare(
        'select count(*) n from job_revisions join jobs on jobs.id = job_id where job_ref = ?',
      )
      .get(ref);
    expect(kept).toEqual({ n: 1 });
  });
});

describe('PUT of a voided job (rule 25)', () => {
  it('given equal content, as a nightly push sends it, revives nothing', async () => {
    const ref = await stored();
    await voidIt(ref);
    const answer = await call('put', job(ref), key(), validJob());
    expect([answer.status, answer.body]).toEqual([
      200,
      { jobRef: ref, revision: 1, status: 'unchanged', voided: true },
    ]);
    const batch = await call('post', job('batch'), key(), {
      jobs: [{ jobRef: ref, ...validJob() }],
    });
    expect(batch.body.results).toEqual([
      { jobRef: ref, revision: 1, status: 'unchanged', voided: true },
    ]);
    expect((await call('get', job(ref), network.manager)).status).toBe(404);
  });

  it('given other content, restores it as the next revision', async () => {
    const before = await billed();
    const ref = await stored();
    await voidIt(ref);
    const answer = await call('put', job(ref), key(), validJob({ notes: 'back' }));
    expect(answer.body).toEqual({ jobRef: ref, revision: 2, status: 'replaced' });
    const sheet = (await call('get', job(ref), network.manager)).body;
    expect(sheet.revisions.map(({ change }: { change: string }) => change)).toEqual([
      'created',
      'restored',
    ]);
    expect(await billed()).toBe(before + 87_000);
  });

  it('given a second void and restoring, goes on counting revisions', async () => {
    const ref = await stored();
    await voidIt(ref);
    await call('put', job(ref), key(), validJob({ notes: '2' }));
    expect((await voidIt(ref)).status).toBe(204);
    const answer = await call('put', job(ref), key(), validJob());
    expect(answer.body).toEqual({ jobRef: ref, revision: 3, status: 'replaced' });
  });

  it('given a bill, is not there (404)', async () => {
    const ref = await stored();
    await voidIt(ref);
    const bill = { issuedOn: '2026-01-30', totalCents: 5 };
    expect((await call('put', `${job(ref)}/invoice`, network.manager, bill)).status).toBe(404);
  });
});

describe('Claims of a voided job (rules 25 and 59)', () => {
  const CLAIM = {
    madeOn: '2026-01-30',
    zone: 'floor',
    cause: 'missed_area',
    decision: 'open',
    labourMinutes: 30,
    productMl: 0,
    costCents: 0,
  };

  it('given the job voided and restored, leave and return with it', async () => {
    const ref = await stored();
    const body = { ...CLAIM, jobRef: ref };
    expect((await call('put', claim(ref), key(), body)).status).toBe(201);
    await voidIt(ref);
    expect((await call('get', claim(ref), network.manager)).status).toBe(404);
    const refused = await call('put', claim(`${ref}-b`), key(), body);
    expect([refused.status, refused.body.problems[0].path]).toEqual([422, '/jobRef']);
    await call('put', job(ref), key(), validJob({ notes: 'back' }));
    expect((await call('get', claim(ref), network.manager)).body).toMatchObject(body);
  });

  it('given a correction that moves completion past a claim, refuses it; up to it, takes it', async () => {
    const ref = await stored();
    await call('put', claim(ref), key(), { ...CLAIM, jobRef: ref });
    const late = validJob({ completedOn: '2026-01-31', package: 'gold' });
    const answer = await call('put', job(ref), key(), late);
    expect(answer.status).toBe(422);
    expect(answer.body.problems.map(({ path }: { path: string }) => path).sort()).toEqual([
      '/completedOn',
      '/package',
    ]);
    const edge = await call('put', job(ref), key(), validJob({ completedOn: '2026-01-30' }));
    expect(edge.body.status).toBe('replaced');
  });

  it('given a voided job restored past its claim, refuses that too', async () => {
    const ref = await stored();
    await call('put', claim(ref), key(), { ...CLAIM, jobRef: ref });
    await voidIt(ref);
    const answer = await call('put', job(ref), key(), validJob({ completedOn: '2026-01-31' }));
    expect([answer.status, answer.body.problems[0].path]).toEqual([422, '/completedOn']);
  });
});
