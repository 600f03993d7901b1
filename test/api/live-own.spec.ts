import pino from 'pino';
import { SignalLooks } from '#server/schedule/signal-looks';
import type { LiveEvent } from '#shared/contracts/live';
import { TestApp } from '../support/app';
import { followLive, type Following } from '../support/follow-live';
import { jobRows } from '../support/job-rows';
import { confirmFile, sendFile } from '../support/send-file';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
const open: Following[] = [];

beforeAll(async () => {
  app = await TestApp.start({ live: { join: 30, breath: 1000 }, now: '2026-02-20T06:30:00Z' });
  network = await makeSmallNetwork(app);
}, 30_000);
afterEach(() => open.splice(0).forEach((following) => following.leave()));
afterAll(() => app.stop());

async function follow(token: string): Promise<Following> {
  const following = await followLive(app, token);
  open.push(following);
  return following;
}
const change = (kind: LiveEvent['kind'], count: number, added: number): LiveEvent => ({
  ...{ kind, branch: 'AAA', count, added },
});
const CLAIM = { madeOn: '2026-01-30', zone: 'floor', cause: 'damage', decision: 'open' };
const at = (path: string): string => `/api/branches/AAA/${path}`;

/** Every way in which a person changes what open pages show, and what is told of it; the later ones build on the first. */
const WAYS: [way: string, send: () => Promise<unknown>, told: LiveEvent][] = [
  ['a job sent', () => call('put', 'jobs/own', validJob({ invoice: null })), change('jobs', 1, 1)],
  [
    'a job billed',
    () => call('put', 'jobs/own/invoice', { issuedOn: '2026-02-02', totalCents: 90_000 }),
    change('jobs', 1, 0),
  ],
  [
    'jobs sent together',
    () => call('post', 'jobs/batch', { jobs: [{ jobRef: 'own-b', ...validJob() }] }),
    change('jobs', 1, 1),
  ],
  ['a job voided', () => call('delete', 'jobs/own-b'), change('jobs', 1, 0)],
  ['a job brought back', () => call('post', 'jobs/own-b/restore'), change('jobs', 1, 0)],
  [
    'a claim sent',
    () => call('put', 'claims/own', { jobRef: 'own', ...CLAIM }),
    change('claims', 1, 1),
  ],
  [
    'claims sent together',
    () =>
      call('post', 'claims/batch', { claims: [{ claimRef: 'own-b', jobRef: 'own', ...CLAIM }] }),
    change('claims', 1, 1),
  ],
  ['a file written', writeFile, change('jobs', 3, 3)],
  ['a signal noted as seen', noteSignal, change('signals', 1, 0)],
];

async function call(method: string, path: string, body?: object): Promise<void> {
  const answer = await app.call(method, at(path), { token: network.manager, body });
  expect([path, answer.status < 300]).toEqual([path, true]);
}

async function writeFile(): Promise<void> {
  const sent = await sendFile(app, network.manager, { content: jobRows(3, 'own-file') });
  const ended = await confirmFile(app, network.manager, sent.body.id);
  expect(ended.body.written).toMatchObject({ created: 3 });
}

async function noteSignal(): Promise<void> {
  const { body } = await app.call('get', '/api/signals', { token: network.manager });
  await call('put', `signals/${body.items[0].id}/acknowledgement`, { note: 'seen' });
}

describe('GET /api/live, of what the listener did', () => {
  beforeAll(async () => {
    await app.call('put', at('jobs/unbilled'), {
      token: network.office,
      body: validJob({ invoice: null }),
    });
    await new SignalLooks(app.kit, pino({ level: 'silent' })).check();
  });

  it.each(WAYS)(
    'given %s, says to that person that it is theirs, to others not whose',
    async (_, send, told) => {
      // What was done before has been told by then.
      await new Promise((resolve) => setTimeout(resolve, 60));
      const own = [await follow(network.manager), await follow(network.manager)];
      const office = await follow(network.office);
      await send();
      for (const window of own) expect(await window.until(1)).toEqual([{ ...told, own: true }]);
      expect(await office.until(1)).toEqual([told]);
      expect(office.text()).not.toContain('own"');
    },
  );

  it('given one’s own and others’ changes together, tells each apart and the others’ as one', async () => {
    const [manager, office] = [await follow(network.manager), await follow(network.office)];
    const { body } = await app.call('get', '/api/people', { token: network.office });
    const idOf = (role: string): number =>
      (body.items as { id: number; role: string }[]).find((one) => one.role === role)!.id;
    const branch = app.kit.store.state.branches.find(({ code }) => code === 'AAA')!;
    const place = { kind: 'jobs', branchId: branch.id } as const;
    const by = idOf('site_manager');
    app.kit.live.tell({ ...place, count: 2, added: 1, by });
    app.kit.live.tell({ ...place, count: 1, added: 1, by: idOf('regional_lead') });
    app.kit.live.tell({ ...place, count: 4 });
    app.kit.live.tell({ ...place, count: 1, by });
    expect(await manager.until(2)).toEqual([
      change('jobs', 5, 1),
      { ...change('jobs', 3, 1), own: true },
    ]);
    expect(await office.until(1)).toEqual([change('jobs', 8, 2)]);
  });

  it('given a branch’s own system, is nobody’s', async () => {
    const manager = await follow(network.manager);
    const token = network.keys['AAA']!;
    await app.call('put', at('jobs/by-key'), { token, body: validJob() });
    expect(await manager.until(1)).toEqual([change('jobs', 1, 1)]);
  });
});
