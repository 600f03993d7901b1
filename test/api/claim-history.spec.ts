import { TestApp, type Answer } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
  await app.call('put', JOB, { token: network.manager, body: validJob() });
});
afterAll(() => app.stop());

const JOB = '/api/branches/AAA/jobs/job';
const CLAIM = { jobRef: 'job', madeOn: '2026-01-29', zone: 'floor', cause: 'missed_area' };
let next = 0;
const fresh = (): string => `/api/branches/AAA/claims/told-${(next += 1)}`;
const put = (at: string, token: string, over: object, ifMatch?: string): Promise<Answer> =>
  app.call('put', at, {
    token,
    body: { ...CLAIM, decision: 'open', ...over },
    ...(ifMatch !== undefined && { headers: { 'if-match': ifMatch } }),
  });
const history = (at: string, token = network.manager): Promise<Answer> =>
  app.call('get', `${at}/history`, { token });
const listed = async (at: string): Promise<Record<string, unknown>> => {
  const { body } = await app.call('get', `/api/claims?q=${at.split('/').at(-1)!}`, {
    token: network.office,
  });
  return body.items[0];
};
const limit = async (claimLimitCents: number | null): Promise<void> => {
  const body = { name: 'Small', currency: 'EUR', feeRate: 0.05, claimLimitCents };
  const answer = await app.call('put', '/api/network', { token: network.office, body });
  if (answer.status !== 200) throw new Error(answer.text);
};

describe('GET …/claims/:claimRef/history', () => {
  it('given corrections by several, tells who sent each, when, by which way, and what it changed', async () => {
    const at = fresh();
    await put(at, network.recorder, { labourMinutes: 30 });
    await put(at, network.keys['AAA']!, { side: 'left', labourMinutes: 45, productMl: 200 });
    await put(at, network.manager, { side: 'left', labourMinutes: 45, note: 'seen' });
    const { status, body } = await history(at, network.recorder);
    expect(status).toBe(200);
    expect(body.items).toEqual([
      {
        revision: 3,
        receivedAt: expect.stringMatching(/^20\d\d-\d\d-\d\dT/),
        source: 'person',
        by: 'manager@network.example',
        change: 'replaced',
        changes: [
          { path: '/productMl', before: 200, after: null },
          { path: '/note', before: null, after: 'seen' },
        ],
      },
      expect.objectContaining({
        revision: 2,
        source: 'key',
        by: 'push key "test system"',
        changes: [
          { path: '/side', before: null, after: 'left' },
          { path: '/labourMinutes', before: 30, after: 45 },
          { path: '/productMl', before: null, after: 200 },
        ],
      }),
      expect.objectContaining({ revision: 1, change: 'created', changes: [] }),
    ]);
  });

  it('given a cost, tells it to those who see money and never to a recorder (rule 24)', async () => {
    const at = fresh();
    await put(at, network.manager, { costCents: 700 });
    await put(at, network.manager, { costCents: 800, productMl: 5 });
    expect((await history(at)).body.items[0].changes).toEqual([
      { path: '/productMl', before: null, after: 5 },
      { path: '/costCents', before: 700, after: 800 },
    ]);
    const { text, body } = await history(at, network.recorder);
    expect(body.items[0].changes).toEqual([{ path: '/productMl', before: null, after: 5 }]);
    expect(text).not.toMatch(/cents/i);
  });

  it('given a claim that is not there, of another branch, or whose job is void, answers 404 (rule 59)', async () => {
    const at = fresh();
    expect((await history(at)).status).toBe(404);
    await put(at, network.recorder, {});
    expect((await history(at.replace('AAA', 'BBB'))).status).toBe(404);
    expect((await history(at, network.keys['AAA'])).status).toBe(403);
    await app.call('delete', JOB, { token: network.manager });
    expect((await history(at)).status).toBe(404);
    await app.call('post', `${JOB}/restore`, { token: network.manager });
    expect((await history(at)).body.items).toHaveLength(1);
  });
});

describe('A claim from made to decided (rule 77)', () => {
  beforeAll(() => limit(10_000));
  afterAll(() => limit(null));

  it('given a cost above the limit, is open with a proposal until head office decides; each step is told', async () => {
    const at = fresh();
    expect((await put(at, network.recorder, { decision: 'accepted' })).status).toBe(403);
    const made = await put(at, network.recorder, {});
    expect([made.status, made.headers.get('etag')]).toEqual([201, '"r1"']);
    const days = { decidedOn: '2026-01-30', paidOn: '2026-02-01' };
    const asked = { decision: 'accepted', costCents: 10_001, ...days };
    const proposed = await put(at, network.manager, asked, '"r1"');
    expect(proposed.body).toMatchObject({ decision: 'open', proposedDecision: 'accepted' });
    expect(await listed(at)).toMatchObject({
      decision: 'open',
      proposedDecision: 'accepted',
      // What waits has neither day yet.
      ...{ decidedOn: null, paidOn: null, counted: true, costCents: 10_001 },
    });
    const waiting = await app.call('get', '/api/claims?waiting=true', { token: network.office });
    expect(waiting.body.claims).toBe(1);
    // The same words from head office are the decision.
    expect((await put(at, network.office, asked, '"r2"')).body).toMatchObject({
      ...{ revision: 3, status: 'replaced', decision: 'accepted' },
    });
    expect(await listed(at)).toMatchObject({
      ...{ decision: 'accepted', proposedDecision: null, ...days },
    });
    const { items } = (await history(at)).body;
    expect(items.map(({ by, changes }: Record<string, unknown>) => [by, changes])).toEqual([
      [
        'office@network.example',
        [
          { path: '/decision', before: 'open', after: 'accepted' },
          { path: '/proposedDecision', before: 'accepted', after: null },
        ],
      ],
      [
        'manager@network.example',
        [
          { path: '/proposedDecision', before: null, after: 'accepted' },
          { path: '/decidedOn', before: null, after: '2026-01-30' },
          { path: '/costCents', before: null, after: 10_001 },
          { path: '/paidOn', before: null, after: '2026-02-01' },
        ],
      ],
      ['recorder@network.example', []],
    ]);
  });

  it('given a cost up to the limit, is decided by the manager', async () => {
    const at = fresh();
    await put(at, network.manager, { decision: 'goodwill', costCents: 10_000 });
    expect(await listed(at)).toMatchObject({ decision: 'goodwill', proposedDecision: null });
  });

  it('given a branch that says otherwise afterwards, keeps the decision of head office and its days', async () => {
    const at = fresh();
    const refused = { decision: 'refused', decidedOn: '2026-01-30', costCents: 20_000 };
    await put(at, network.office, refused);
    const other = { decision: 'accepted', decidedOn: '2026-02-01', costCents: 20_000 };
    await put(at, network.keys['AAA']!, other);
    expect(await listed(at)).toMatchObject({
      ...{ decision: 'refused', proposedDecision: 'accepted', decidedOn: '2026-01-30' },
      counted: false,
    });
    await put(at, network.keys['AAA']!, { costCents: 20_000 });
    expect(await listed(at)).toMatchObject({
      ...{ decision: 'refused', proposedDecision: null, decidedOn: '2026-01-30' },
    });
    const { body } = await app.call('get', at, { token: network.manager });
    expect(body).toMatchObject({ decision: 'refused', decidedOn: '2026-01-30' });
  });

  it('given a recorder who corrects a decided claim, keeps its days whether they are sent or not', async () => {
    const at = fresh();
    const days = { decidedOn: '2026-01-30', paidOn: '2026-02-01' };
    await put(at, network.manager, { decision: 'accepted', costCents: 500, ...days });
    await put(at, network.recorder, { labourMinutes: 5 });
    expect(await listed(at)).toMatchObject({ decision: 'accepted', costCents: 500, ...days });
    const same = { decision: 'accepted', labourMinutes: 5, ...days };
    expect((await put(at, network.recorder, same)).body.status).toBe('unchanged');
    const moved = await put(at, network.recorder, { ...same, decidedOn: '2026-01-31' });
    expect(moved.status).toBe(403);
    expect(await listed(at)).toMatchObject(days);
  });

  it('given an ETag that is not the newest, is refused naming who changed it (rule 73)', async () => {
    const at = fresh();
    await put(at, network.recorder, {});
    await put(at, network.manager, { note: 'meanwhile' });
    const { headers } = await app.call('get', at, { token: network.recorder });
    expect(headers.get('etag')).toBe('"r2"');
    const late = await put(at, network.recorder, { note: 'late' }, '"r1"');
    expect(late.status).toBe(412);
    expect(late.body.detail).toContain('manager@network.example');
    expect((await put(at, network.recorder, { note: 'now' }, '"r2"')).status).toBe(200);
  });
});
