import { TestApp, type Answer } from '../support/app';
import { makeSmallNetwork, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
});
afterAll(() => app.stop());

const at = (ref: string, branch = 'AAA'): string =>
  `/api/branches/${branch}/bookings/${encodeURIComponent(ref)}`;
const call = (
  method: string,
  path: string,
  token: string | undefined,
  body?: unknown,
): Promise<Answer> => app.call(method, path, { token, ...(body !== undefined && { body }) });
const BOOKING = { expectedOn: '2026-02-10', package: 'full', bodyType: 'suv' };
const list = async (token: string, branch = 'AAA'): Promise<Answer> =>
  call('get', `/api/branches/${branch}/bookings`, token);

describe('Bookings (rule 75)', () => {
  it('given one by a push key, is new, then changed, then gone', async () => {
    const token = network.keys['AAA'];
    const made = await call('put', at('b/1'), token, BOOKING);
    expect([made.status, made.body]).toEqual([201, { ...BOOKING, branch: 'AAA', ref: 'b/1' }]);
    const changed = { ...BOOKING, expectedOn: '2026-02-11' };
    expect((await call('put', at('b/1'), token, changed)).status).toBe(200);
    expect((await list(network.manager)).body.items).toEqual([
      { ...changed, branch: 'AAA', ref: 'b/1' },
    ]);
    expect((await call('delete', at('b/1'), token)).status).toBe(204);
    expect((await call('delete', at('b/1'), token)).status).toBe(404);
    expect((await list(network.manager)).body.items).toEqual([]);
  });

  it('given several, lists those from today on, soonest first, of the branch asked for', async () => {
    const days = ['2026-03-01', '2026-02-02', '2026-02-01', '2026-02-15'];
    for (const [n, expectedOn] of days.entries()) {
      await call('put', at(`d-${n}`), network.recorder, { ...BOOKING, expectedOn });
    }
    await call('put', at('theirs', 'BBB'), network.office, BOOKING);
    const { items } = (await list(network.recorder)).body as { items: { ref: string }[] };
    expect(items.map(({ ref }) => ref)).toEqual(['d-1', 'd-3', 'd-0']);
    expect((await list(network.manager, 'BBB')).status).toBe(404);
    expect((await list(network.lead, 'BBB')).body.items).toHaveLength(1);
  });

  it('given several things wrong, names them all', async () => {
    const body = { expectedOn: 'soon', package: 'gold', bodyType: 'coupe', plate: 'X' };
    const answer = await call('put', at('bad'), network.manager, body);
    const paths = answer.body.problems.map(({ path }: { path: string }) => path).sort();
    expect([answer.status, paths]).toEqual([
      422,
      ['/bodyType', '/expectedOn', '/package', '/plate'],
    ]);
  });

  it('given a lead or a key that only sends, may not write or read respectively', async () => {
    expect((await call('put', at('x'), network.lead, BOOKING)).status).toBe(403);
    expect((await call('delete', at('x'), network.lead)).status).toBe(403);
    expect((await list(network.keys['AAA']!)).status).toBe(403);
    expect((await call('put', at('x', 'BBB'), network.keys['AAA'], BOOKING)).status).toBe(404);
  });
});
