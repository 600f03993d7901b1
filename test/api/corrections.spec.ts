import { TestApp, type Answer } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';
import { findingsWithOneLeft } from '../support/walk-contracts';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
}, 30_000);
afterAll(() => app.stop());

let next = 0;
const at = (ref: string, rest = ''): string => `/api/branches/AAA/jobs/${ref}${rest}`;
const call = (
  method: string,
  path: string,
  body?: unknown,
  options: { token?: string; headers?: Record<string, string> } = {},
): Promise<Answer> =>
  app.call(method, path, {
    token: network.manager,
    ...(body !== undefined && { body }),
    ...options,
  });
const restore = (ref: string, headers: Record<string, string> = {}): Promise<Answer> =>
  call('post', at(ref, '/restore'), undefined, { headers });
async function stored(overrides: Record<string, unknown> = {}): Promise<string> {
  const ref = `corrected-${(next += 1)}`;
  expect((await call('put', at(ref), validJob(overrides))).status).toBe(201);
  return ref;
}
const figures = async (): Promise<unknown> => {
  const { weeks, bridge } = (await call('get', '/api/analytics/margin?branch=AAA')).body;
  const { cells } = (await call('get', '/api/analytics/rot?branch=AAA')).body;
  const { use } = (await call('get', '/api/analytics/products?branch=AAA')).body;
  const { items } = (await call('get', '/api/come-back?branch=AAA')).body;
  return { weeks, bridge, cells, use, items };
};

describe('Changes of a job', () => {
  it('given one revision, tells everything as new', async () => {
    const { body } = await call('get', at(await stored(), '/changes'));
    expect(body.from).toBeNull();
    expect(body.to).toMatchObject({ revision: 1, change: 'created', source: 'person' });
    expect(body.changes).toContainEqual({ path: '/package', before: null, after: 'full' });
  });

  it('given several revisions, tells the last two, or those asked for', async () => {
    const ref = await stored();
    await call('put', at(ref), validJob({ boughtInCents: 500 }));
    await call('put', at(ref), validJob({ boughtInCents: 500, notes: 'towed in' }));
    const last = (await call('get', at(ref, '/changes'))).body;
    expect([last.from.revision, last.to.revision]).toEqual([2, 3]);
    expect(last.changes).toEqual([{ path: '/notes', before: null, after: 'towed in' }]);
    const asked = (await call('get', at(ref, '/changes?from=1&to=2'))).body;
    expect(asked.changes).toEqual([{ path: '/boughtInCents', before: null, after: 500 }]);
    const whole = (await call('get', at(ref, '/changes?from=1'))).body;
    expect(whole.changes).toHaveLength(2);
  });

  it('given a recorder, tells no money but the price quoted (rule 24)', async () => {
    const ref = await stored();
    const { estimate } = validJob() as { estimate: { priceCents: number } };
    const after = { boughtInCents: 500, estimate: { ...estimate, priceCents: 1 }, invoice: null };
    await call('put', at(ref), validJob(after));
    const { changes } = (
      await call('get', at(ref, '/changes'), undefined, { token: network.recorder })
    ).body as { changes: { path: string }[] };
    expect(changes.map(({ path }) => path).sort()).toEqual([
      '/estimate/priceCents',
      '/invoice/issuedOn',
      '/invoice/number',
    ]);
  });

  it('given a revision or a job that is not there, or a voided one, answers 404', async () => {
    const ref = await stored();
    for (const path of ['/changes?to=2', '/changes?from=7', '/changes?from=7&to=1']) {
      expect([path, (await call('get', at(ref, path))).status]).toEqual([path, 404]);
    }
    expect((await call('get', at('never', '/changes'))).status).toBe(404);
    await call('delete', at(ref));
    expect((await call('get', at(ref, '/changes'))).status).toBe(404);
    expect((await call('get', at(ref, '/changes?from=0'))).status).toBe(422);
  });
});

describe('Restoring a voided job (rule 25)', () => {
  it('given a void, brings back every figure, its claims and its marks', async () => {
    const ref = await stored({ findings: findingsWithOneLeft() });
    const claim = {
      jobRef: ref,
      madeOn: '2026-01-30',
      zone: 'floor',
      cause: 'damage',
      decision: 'open',
    };
    await call('put', `/api/branches/AAA/claims/of-${ref}`, claim);
    await call('put', `/api/branches/AAA/come-back/${ref}/walked`, { status: 'booked' });
    const before = await figures();
    const sheet = await call('get', at(ref));
    await call('delete', at(ref));
    expect(await figures()).not.toEqual(before);
    const answer = await restore(ref);
    expect([answer.status, answer.body, answer.headers.get('etag')]).toEqual([
      200,
      { jobRef: ref, revision: 1 },
      '"r1"',
    ]);
    expect(await figures()).toEqual(before);
    expect((await call('get', at(ref))).text).toBe(sheet.text);
    // The claim hangs on it again: completion cannot be moved behind it (rule 59).
    const late = await call('put', at(ref), validJob({ completedOn: '2026-01-31', invoice: null }));
    expect([late.status, late.body.problems[0].path]).toEqual([422, '/completedOn']);
  });

  it('given costs changed while it was void, comes back at the costs of now', async () => {
    const ref = await stored();
    await call('delete', at(ref));
    await call(
      'put',
      '/api/branches/AAA/rates/2026-01-27',
      { hourlyCostCents: 7200 },
      { token: network.office },
    );
    await restore(ref);
    expect((await call('get', at(ref))).body.money.labourCents).toBe(735 * 120);
    await call(
      'put',
      '/api/branches/AAA/rates/2026-01-27',
      { hourlyCostCents: 3600 },
      { token: network.office },
    );
  });

  it('given a job that is not void or not there, answers 404', async () => {
    const ref = await stored();
    expect((await restore(ref)).status).toBe(404);
    expect((await restore('never')).status).toBe(404);
    await call('delete', at(ref));
    expect((await restore(ref)).status).toBe(200);
    expect((await restore(ref)).status).toBe(404);
  });

  it('given If-Match, restores only the revision that was seen (rule 73)', async () => {
    const ref = await stored();
    await call('delete', at(ref));
    const refused = await restore(ref, { 'if-match': '"r2"' });
    expect([refused.status, refused.body.detail]).toEqual([
      412,
      expect.stringContaining('voided by manager@network.example'),
    ]);
    expect((await restore(ref, { 'if-match': '"r1"' })).status).toBe(200);
  });

  it('given a restored job, says so in the trail and lets it be voided again', async () => {
    const ref = await stored();
    await call('delete', at(ref));
    await restore(ref);
    expect((await call('delete', at(ref))).status).toBe(204);
    const told = app.kit.store.unscoped
      .prepare('select action, actor from audit_events where subject = ? order by id')
      .all(`/branches/AAA/jobs/${ref}`);
    const actor = 'manager@network.example';
    expect(told).toEqual(
      ['job.void', 'job.restore', 'job.void'].map((action) => ({ action, actor })),
    );
  });
});

describe('The list of voided jobs', () => {
  const list = (query = ''): Promise<Answer> =>
    call('get', `/api/branches/BBB/voided-jobs${query}`, undefined, { token: network.office });

  it('given voids and restores between two pages, tells each once, the last voided first', async () => {
    const refs = ['v-a', 'v-A', 'v-b', 'v-c', 'v-d'];
    for (const ref of refs) {
      const path = `/api/branches/BBB/jobs/${ref}`;
      await call('put', path, validJob(), { token: network.keys['BBB']! });
      await call('delete', path, undefined, { token: network.office });
    }
    const first = (await list('?limit=2')).body;
    expect(first.items.map(({ jobRef }: { jobRef: string }) => jobRef)).toEqual(['v-d', 'v-c']);
    expect(first.items[0]).toEqual({
      branch: 'BBB',
      jobRef: 'v-d',
      revision: 1,
      make: 'Velder',
      model: 'Tessock',
      firstRegistered: '2009-05',
      package: 'full',
      completedOn: '2026-01-28',
      voidedAt: expect.stringMatching(/^\d{4}-/) as string,
      voidedBy: 'office@network.example',
    });
    await call('post', '/api/branches/BBB/jobs/v-d/restore', undefined, { token: network.office });
    const rest = (await list(`?limit=3&cursor=${first.nextCursor}`)).body;
    expect(rest.items.map(({ jobRef }: { jobRef: string }) => jobRef)).toEqual([
      'v-b',
      'v-A',
      'v-a',
    ]);
    expect(rest.nextCursor).toBeNull();
  });

  it('given a cursor of another list, answers 422', async () => {
    expect((await list('?cursor=e30')).status).toBe(422);
  });
});
