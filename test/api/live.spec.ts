import { LiveFeed } from '#server/live/live-feed';
import { advanceClock, holdClock } from '../support/advance-clock';
import { TestApp } from '../support/app';
import { followLive, type Following } from '../support/follow-live';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
const open: Following[] = [];

beforeAll(async () => {
  app = await TestApp.start({ live: { join: 30, breath: 60 } });
  network = await makeSmallNetwork(app);
}, 30_000);
afterEach(() => open.splice(0).forEach((following) => following.leave()));
afterAll(() => app.stop());

async function follow(token: string): Promise<Following> {
  const following = await followLive(app, token);
  open.push(following);
  return following;
}

let number = 0;
/** Sends a new job as head office, and gives its path. */
async function send(branch: string, more: Record<string, unknown> = {}): Promise<string> {
  number += 1;
  const path = `/api/branches/${branch}/jobs/live-${number}`;
  const sent = await app.call('put', path, { token: network.office, body: validJob(more) });
  expect(sent.status).toBe(201);
  return path;
}

const idOf = (branch: string): number =>
  app.kit.store.state.branches.find(({ code }) => code === branch)!.id;
const person = async (email: string) => {
  const { body } = await app.call('get', '/api/people', { token: network.office });
  return (body.items as { id: number; email: string }[]).find((one) => one.email === email)!.id;
};

describe('GET /api/live', () => {
  it('given a person, begins at once as an event stream that nobody keeps or holds back', async () => {
    const { status, headers, text } = await follow(network.manager);
    expect(status).toBe(200);
    expect(headers.get('content-type')).toMatch(/^text\/event-stream\b/);
    expect(headers.get('cache-control')).toBe('no-store');
    expect(headers.get('x-accel-buffering')).toBe('no');
    expect(headers.get('content-encoding')).toBeNull();
    expect(text()).toMatch(/^retry: \d+\nevent: hello\ndata: \{\}\n\n/);
  });

  it('given no token, answers 401; a push key, 403', async () => {
    expect((await app.call('get', '/api/live')).status).toBe(401);
    expect((await app.call('get', '/api/live', { token: network.keys['AAA'] })).status).toBe(403);
  });

  it('asked for its head only, ends', async () => {
    const answer = await app.call('head', '/api/live', { token: network.manager });
    expect([answer.status, answer.text]).toEqual([200, '']);
  });

  it('given a job sent by a key, corrected and voided, tells of each what it was', async () => {
    const following = await follow(network.manager);
    number += 1;
    const path = `/api/branches/AAA/jobs/live-${number}`;
    const token = network.keys['AAA']!;
    await app.call('put', path, { token, body: validJob() });
    expect(await following.until(1)).toEqual([{ kind: 'jobs', branch: 'AAA', count: 1, added: 1 }]);
    await app.call('put', path, { token, body: validJob({ notes: 'other' }) });
    await following.until(2);
    await app.call('delete', path, { token: network.office });
    expect((await following.until(3)).slice(1)).toEqual([
      { kind: 'jobs', branch: 'AAA', count: 1, added: 0 },
      { kind: 'jobs', branch: 'AAA', count: 1, added: 0 },
    ]);
    expect(following.text()).toMatch(/id: 1\n[^]*id: 2\n[^]*id: 3\n/);
  });

  it('given an event, has what it tells of in the next answer', async () => {
    const following = await follow(network.manager);
    const path = await send('AAA');
    await following.until(1);
    expect((await app.call('get', path, { token: network.manager })).status).toBe(200);
  });

  it('given the same job again or one that is refused, tells nothing', async () => {
    const path = await send('AAA');
    const following = await follow(network.manager);
    await app.call('put', path, { token: network.office, body: validJob() });
    const refused = await app.call('put', `${path}-x`, {
      token: network.office,
      body: validJob({ package: 'none' }),
    });
    expect(refused.status).toBe(422);
    await send('AAA');
    // Only the last.
    expect(await following.until(1)).toEqual([{ kind: 'jobs', branch: 'AAA', count: 1, added: 1 }]);
  });

  it('given a batch, tells once how many', async () => {
    const following = await follow(network.manager);
    const jobs = Array.from({ length: 40 }, (_, n) => ({
      jobRef: `batch-${n}`,
      ...validJob(n === 7 ? { package: 'none' } : {}),
    }));
    await app.call('post', '/api/branches/AAA/jobs/batch', {
      token: network.office,
      body: { jobs },
    });
    const changes = await following.until(1);
    expect(changes).toEqual([{ kind: 'jobs', branch: 'AAA', count: 39, added: 39 }]);
  });

  it('given claims, tells of them', async () => {
    const path = await send('AAA');
    const following = await follow(network.recorder);
    const claim = {
      jobRef: path.split('/').at(-1),
      madeOn: '2026-01-30',
      zone: 'floor',
      cause: 'damage',
      decision: 'open',
    };
    await app.call('put', '/api/branches/AAA/claims/live', { token: network.manager, body: claim });
    expect(await following.until(1)).toEqual([
      { kind: 'claims', branch: 'AAA', count: 1, added: 1 },
    ]);
  });

  it('given changes at branches out of scope, tells nobody else, not even by its numbers', async () => {
    const manager = await follow(network.manager);
    const lead = await follow(network.lead);
    const office = await follow(network.office);
    for (const branch of ['CCC', 'BBB', 'HHH']) await send(branch);
    await send('AAA');
    const branchesOf = (changes: { branch: string }[]) => changes.map(({ branch }) => branch);
    expect(branchesOf(await manager.until(1))).toEqual(['AAA']);
    expect(branchesOf(await lead.until(2))).toEqual(['BBB', 'AAA']);
    expect(branchesOf(await office.until(4))).toEqual(['CCC', 'BBB', 'HHH', 'AAA']);
    expect(manager.text()).toContain('id: 1\n');
    expect(manager.text()).not.toContain('id: 2\n');
  });

  it('given signals, tells all but recorders', async () => {
    const recorder = await follow(network.recorder);
    const manager = await follow(network.manager);
    app.kit.live.tell({ kind: 'signals', branchId: idOf('AAA'), count: 2 });
    app.kit.live.tell({ kind: 'jobs', branchId: idOf('AAA'), count: 1 });
    expect(await manager.until(2)).toMatchObject([{ kind: 'signals', count: 2 }, { kind: 'jobs' }]);
    expect(await recorder.until(1)).toMatchObject([{ kind: 'jobs' }]);
  });

  it('given nothing to tell, breathes', async () => {
    const following = await follow(network.manager);
    await new Promise((resolve) => setTimeout(resolve, 200));
    expect(following.text()).toContain('\n\n:\n\n');
  });
});

describe('a stream of live changes, while it is open', () => {
  it('given a person moved to another branch, follows from the next event on (rule 64)', async () => {
    const token = await app.signIn('moved@network.example', 'site_manager', { branches: ['AAA'] });
    const following = await follow(token);
    const id = await person('moved@network.example');
    const place = { name: 'Moved', role: 'site_manager', branches: ['BBB'], active: true };
    const moved = await app.call('put', `/api/people/${id}`, {
      token: network.office,
      body: place,
    });
    expect(moved.status).toBe(200);
    await send('AAA');
    await send('BBB');
    expect((await following.until(1)).map(({ branch }) => branch)).toEqual(['BBB']);
  });

  it('given a manager made a recorder, tells no signals from then on', async () => {
    const token = await app.signIn('lowered@network.example', 'site_manager', {
      branches: ['AAA'],
    });
    const following = await follow(token);
    const id = await person('lowered@network.example');
    const place = { name: 'Lowered', role: 'recorder', branches: ['AAA'], active: true };
    await app.call('put', `/api/people/${id}`, { token: network.office, body: place });
    app.kit.live.tell({ kind: 'signals', branchId: idOf('AAA'), count: 1 });
    app.kit.live.tell({ kind: 'claims', branchId: idOf('AAA'), count: 1 });
    expect((await following.until(1)).map(({ kind }) => kind)).toEqual(['claims']);
  });

  it('given a person who may no longer sign in, ends, event or not', async () => {
    const token = await app.signIn('gone@network.example', 'site_manager', { branches: ['AAA'] });
    const following = await follow(token);
    const id = await person('gone@network.example');
    const place = { name: 'Gone', role: 'site_manager', branches: ['AAA'], active: false };
    await app.call('put', `/api/people/${id}`, { token: network.office, body: place });
    await following.over;
    expect(following.changes()).toEqual([]);
  });

  it('given a sign-in that was ended, ends', async () => {
    const token = await app.signIn('out@network.example', 'recorder', { branches: ['AAA'] });
    const following = await follow(token);
    const ended = await app.call('delete', '/api/auth/sign-ins', { token });
    expect(ended.status).toBe(204);
    await following.over;
  });

  it('given an access token that is over, ends', async () => {
    const following = await follow(network.manager);
    holdClock();
    try {
      advanceClock(590);
      await send('AAA');
      expect(await following.until(1)).toHaveLength(1);
      advanceClock(20);
      await following.over;
    } finally {
      jest.useRealTimers();
    }
    expect(following.changes()).toHaveLength(1);
  });

  it('given a ninth stream of one person, ends the oldest', async () => {
    const streams: Following[] = [];
    for (let n = 0; n < 9; n += 1) streams.push(await follow(network.lead));
    await streams[0]!.over;
    await send('AAA');
    for (const following of streams.slice(1)) expect(await following.until(1)).toHaveLength(1);
    // Another person's are not counted with them.
    const manager = await follow(network.manager);
    await send('AAA');
    expect(await manager.until(1)).toHaveLength(1);
  });

  it('given a server that stops, ends', async () => {
    const feed = new LiveFeed(app.kit.store, { join: 10, breath: 1000 });
    const usual = app.kit.live;
    app.kit.live = feed;
    try {
      const following = await follow(network.manager);
      feed.close();
      await following.over;
    } finally {
      app.kit.live = usual;
    }
  });
});
