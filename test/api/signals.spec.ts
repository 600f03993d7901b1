import pino from 'pino';
import { SignalLooks } from '#server/schedule/signal-looks';
import { TestApp } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;

/** Two branches with a forgotten bill and one with a danger past its day. */
beforeAll(async () => {
  app = await TestApp.start({ now: '2026-02-20T06:30:00Z' });
  network = await makeSmallNetwork(app);
  const left = {
    ...{ ref: 'f', zone: 'floor', side: 'left', seenAs: 'holed', structural: true },
    action: 'deferred',
  };
  await put('AAA', 'jobs/bill', validJob({ invoice: null }));
  await put('BBB', 'jobs/bill', validJob({ invoice: null }));
  await put('CCC', 'jobs/bill', validJob({ invoice: null }));
  await put('BBB', 'jobs/rot', validJob({ findings: [left] }));
  await put('BBB', 'come-back/rot/f', { status: 'open', dueOn: '2026-02-10' });
});
afterAll(() => app.stop());

async function put(branch: string, path: string, body: object): Promise<void> {
  const at = `/api/branches/${branch}/${path}`;
  const answer = await app.call('put', at, { token: network.office, body });
  expect([path, answer.status < 300]).toEqual([path, true]);
}
/** A look on a day, as the night makes it. */
const look = (now: string) =>
  new SignalLooks(
    { ...app.kit, clock: { now: () => new Date(now) } },
    pino({ level: 'silent' }),
  ).check();
const list = (query = '', token = network.office) =>
  app.call('get', `/api/signals${query}`, { token });
const names = async (query = '', token?: string) =>
  ((await list(query, token)).body.items as { branch: string; kind: string }[]).map(
    ({ branch, kind }) => `${branch} ${kind}`,
  );
const ALL = ['BBB come_backs_due', 'AAA unbilled', 'BBB unbilled', 'CCC unbilled'];

describe('Signals', () => {
  it('before the first look, are none, and it is said that nobody looked', async () => {
    expect((await list()).body).toEqual({
      ...{ items: [], nextCursor: null, lookedOn: null },
      counts: { open: 0, acknowledged: 0, over: 0 },
    });
  });

  it('given two looks on one day, are each there once, what can hurt somebody first', async () => {
    await look('2026-02-20T06:30:00Z');
    await look('2026-02-20T08:30:00Z');
    expect(await names()).toEqual(ALL);
    const { body } = await list();
    expect(body.counts).toEqual({ open: 4, acknowledged: 0, over: 0 });
    expect(body.lookedOn).toBe('2026-02-20');
  });

  it('given pages of one, walks each once', async () => {
    const walked: string[] = [];
    let cursor: string | null = '';
    while (cursor !== null) {
      const from: string = cursor === '' ? '' : `&cursor=${cursor}`;
      const { body } = await list(`?limit=1${from}`);
      walked.push(...body.items.map((one: { id: number }) => `${one.id}`));
      cursor = body.nextCursor;
    }
    expect(new Set(walked).size).toBe(4);
    expect(walked).toHaveLength(4);
  });

  it('given roles and filters, shows each caller what is theirs', async () => {
    expect(await names('', network.lead)).toEqual(ALL.slice(0, 3));
    expect(await names('', network.manager)).toEqual(['AAA unbilled']);
    expect((await list('', network.recorder)).status).toBe(403);
    expect(await names('?branch=CCC')).toEqual(['CCC unbilled']);
    expect(await names('?branch=CCC', network.manager)).toEqual([]);
    expect(await names('?kind=come_backs_due')).toEqual(['BBB come_backs_due']);
    expect((await list('?cursor=x')).status).toBe(422);
  });

  it('given one, lists its cars as they stand, and none to a stranger', async () => {
    const { id } = (await list('?branch=CCC')).body.items[0];
    const at = `/api/branches/CCC/signals/${id}`;
    const { body } = await app.call('get', at, { token: network.office });
    expect(body.listed).toMatchObject([{ jobRef: 'bill', why: 'waits 23 days' }]);
    expect((await app.call('get', at, { token: network.manager })).status).toBe(404);
    const elsewhere = `/api/branches/AAA/signals/${id}`;
    expect((await app.call('get', elsewhere, { token: network.office })).status).toBe(404);
  });

  it('given a note, is acknowledged by name; another note takes its place; it ends by itself when corrected', async () => {
    const { id } = (await list('?branch=AAA')).body.items[0];
    const at = `/api/branches/AAA/signals/${id}/acknowledgement`;
    const note = (text: string, token = network.manager) =>
      app.call('put', at, { token, body: { note: text } });
    expect((await note(' ')).status).toBe(422);
    expect((await note('x', network.recorder)).status).toBe(403);
    expect((await note('bill is coming')).body).toMatchObject({
      state: 'acknowledged',
      acknowledged: { note: 'bill is coming' },
    });
    expect((await note('sent today')).body.acknowledged.note).toBe('sent today');
    await put('AAA', 'jobs/bill', validJob());
    await look('2026-02-21T06:30:00Z');
    expect(await names('?branch=AAA')).toEqual([]);
    const over = (await list('?branch=AAA&state=over')).body.items[0];
    expect(over).toMatchObject({ id, state: 'over', overOn: '2026-02-21' });
    const late = await note('too late');
    expect([late.status, late.body.detail]).toEqual([
      409,
      'This signal has been over since 2026-02-21; there is nothing left to take note of.',
    ]);
    expect((await list()).body.counts).toEqual({ open: 3, acknowledged: 0, over: 0 });
  });
});
