import { sql } from '#db/database';
import { advanceClock, holdClock } from '../support/advance-clock';
import { TestApp } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;

beforeAll(async () => {
  holdClock();
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
});
afterAll(async () => {
  await app.stop();
  jest.useRealTimers();
});
// The tokens of the small network live ten minutes; the clock is moved by seconds only.

const make = (branch = 'AAA', label = 'Workshop system') =>
  app.call('post', `/api/branches/${branch}/keys`, { token: network.office, body: { label } });
const list = (branch = 'AAA') =>
  app.call('get', `/api/branches/${branch}/keys`, { token: network.office });
const revoke = (id: string, branch = 'AAA') =>
  app.call('delete', `/api/branches/${branch}/keys/${id}`, { token: network.office });
let sent = 0;
const send = (key: string, branch = 'AAA') => {
  sent += 1;
  return app.call('put', `/api/branches/${branch}/jobs/K-${sent}`, {
    token: key,
    body: validJob(),
  });
};

describe('a push key', () => {
  it('when made, is shown once and kept as a hash only', async () => {
    const made = await make();
    expect(made.status).toBe(201);
    expect(made.body).toEqual({
      id: expect.stringMatching(/^[0-9a-f]{12}$/),
      label: 'Workshop system',
      key: expect.stringMatching(/^usk_[0-9a-f]{12}_[0-9a-f]{64}$/),
    });
    const secret = made.body.key.split('_')[2];
    const listed = await list();
    expect(listed.text).not.toContain(secret);
    expect(listed.body.items).toContainEqual({
      id: made.body.id,
      label: 'Workshop system',
      createdAt: expect.stringMatching(/Z$/),
      lastUsedAt: null,
      revokedAt: null,
    });
    const { unscoped } = app.kit.store;
    const dump = JSON.stringify([
      unscoped.all(sql('push_keys')),
      unscoped.all(sql('audit_events')),
    ]);
    expect(dump).toContain(made.body.id);
    expect(dump).not.toContain(secret);
  });

  it('sends jobs of its branch, finds no other branch, and has no other call', async () => {
    const { key } = (await make()).body;
    expect((await send(key)).status).toBe(201);
    expect((await send(key, 'BBB')).status).toBe(404);
    for (const path of ['/api/people', '/api/jobs', '/api/auth/me', '/api/branches/AAA/keys']) {
      expect([path, (await app.call('get', path, { token: key })).status]).toEqual([path, 403]);
    }
  });

  it('when only nearly right, is refused', async () => {
    const { id, key } = (await make()).body;
    const { key: other } = (await make()).body;
    const [, , secret] = key.split('_');
    const near = [
      `usk_${id}_${'0'.repeat(64)}`,
      `usk_${id}_${secret.slice(0, -1)}`,
      `usk_${id}_${secret}0`,
      `usk_${'0'.repeat(12)}_${secret}`,
      `usk_${id}_${other.split('_')[2]}`,
      `usk_${id}_`,
      key.toUpperCase(),
      ` ${key} x`,
    ];
    for (const token of near) expect([token, (await send(token)).status]).toEqual([token, 401]);
    expect((await send(key)).status).toBe(201);
  });

  it('when revoked, stops at once and stays in the list', async () => {
    const { id, key } = (await make()).body;
    expect((await send(key)).status).toBe(201);
    expect((await revoke(id, 'BBB')).status).toBe(404);
    expect((await send(key)).status).toBe(201);
    expect((await revoke(id)).status).toBe(204);
    expect((await send(key)).status).toBe(401);
    expect((await revoke(id)).status).toBe(404);
    expect((await revoke('nosuchkey')).status).toBe(404);
    const { items } = (await list()).body;
    expect(items.find((item: { id: string }) => item.id === id)).toMatchObject({
      revokedAt: expect.stringMatching(/Z$/),
    });
  });

  it('when used, notes it once a minute at most', async () => {
    const { id, key } = (await make()).body;
    const stamp = async () =>
      (await list()).body.items.find((item: { id: string }) => item.id === id).lastUsedAt;
    const first = new Date().toISOString();
    await send(key);
    expect(await stamp()).toBe(first);
    advanceClock(30);
    await send(key);
    expect(await stamp()).toBe(first);
    advanceClock(31);
    const third = new Date().toISOString();
    await send(key);
    expect(await stamp()).toBe(third);
  });

  it('is made, listed and revoked by head office only', async () => {
    const { id } = (await make()).body;
    for (const who of ['lead', 'manager', 'recorder'] as const) {
      const token = network[who];
      const path = '/api/branches/AAA/keys';
      const statuses = [
        await app.call('post', path, { token, body: { label: 'x' } }),
        await app.call('get', path, { token }),
        await app.call('delete', `${path}/${id}`, { token }),
      ].map(({ status }) => status);
      expect([who, statuses]).toEqual([who, [403, 403, 403]]);
    }
    expect((await make('NOPE')).status).toBe(404);
    expect((await make('AAA', ' ')).body.problems[0].path).toBe('/label');
  });

  it('leaves in the trail who made and who revoked it', async () => {
    const { id } = (await make('CCC', 'Old system')).body;
    await revoke(id, 'CCC');
    const events = app.kit.store.unscoped.all(
      sql('audit_events')
        .where({ subject: `/branches/CCC/keys/${id}` })
        .orderBy('id')
        .select('action', 'actor', 'detail'),
    );
    expect(events).toEqual([
      { action: 'key.add', actor: 'office@network.example', detail: '{"label":"Old system"}' },
      { action: 'key.revoke', actor: 'office@network.example', detail: '{}' },
    ]);
  });
});
