import { sql } from '#db/database';
import { TestApp } from '../support/app';
import { makeSmallNetwork, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeEach(async () => {
  app = await TestApp.start({ now: '2026-02-02T06:30:00Z' });
  network = await makeSmallNetwork(app);
});
afterEach(() => app.stop());

const ofNetwork = (measure: string, value: unknown, token = network.office) =>
  app.call('put', `/api/targets/${measure}`, { token, body: { value } });
const ofBranch = (branch: string, measure: string, value: unknown, token = network.lead) =>
  app.call('put', `/api/branches/${branch}/targets/${measure}`, { token, body: { value } });
const list = (token = network.manager) => app.call('get', '/api/targets', { token });
const trail = (action: string) =>
  app.kit.store.unscoped
    .all<{ detail: string; subject: string }>(
      sql('audit_events').where({ action }).orderBy('id').select('detail', 'subject'),
    )
    .map(({ detail, subject }) => [subject, JSON.parse(detail) as unknown]);

describe('targets', () => {
  it('given none set, lists every measure without a value, of the branches in scope', async () => {
    const { status, body } = await list();
    expect(status).toBe(200);
    const measures = ['overrun', 'claims', 'product', 'margin'];
    expect(body.network).toEqual(measures.map((measure) => ({ measure, value: null })));
    expect(body.branches).toEqual(
      measures.map((measure) => ({ branch: 'AAA', measure, own: null, holds: null })),
    );
  });

  it('given one of the network and one of a branch, the branch is held to its own', async () => {
    expect((await ofNetwork('overrun', 1.15)).body).toEqual({ measure: 'overrun', value: 1.15 });
    const set = await ofBranch('AAA', 'overrun', 1.3);
    expect(set.body).toEqual({ branch: 'AAA', measure: 'overrun', own: 1.3, holds: 1.3 });
    const { body } = await list(network.lead);
    const overrun = body.branches.filter((one: { measure: string }) => one.measure === 'overrun');
    expect(overrun).toEqual([
      { branch: 'AAA', measure: 'overrun', own: 1.3, holds: 1.3 },
      { branch: 'BBB', measure: 'overrun', own: null, holds: 1.15 },
    ]);
    const gone = await ofBranch('AAA', 'overrun', null);
    expect(gone.body).toMatchObject({ own: null, holds: 1.15 });
  });

  it('given the margin, is one truth with the set-up of network and branch (rule 80)', async () => {
    await ofNetwork('margin', 0.4);
    await ofBranch('AAA', 'margin', 0.31, network.office);
    const read = await app.call('get', '/api/network', { token: network.office });
    expect(read.body.targetMarginShare).toBe(0.4);
    const put = await app.call('put', '/api/branches/AAA', {
      token: network.office,
      body: {
        ...{ name: 'Branch AAA', region: 'COAST', timeZone: 'Europe/Berlin' },
        ...{ openedOn: '2015-01-01', targetMarginShare: 0.35 },
      },
    });
    expect(put.status).toBe(200);
    const margin = (await list()).body.branches.at(-1);
    expect(margin).toEqual({ branch: 'AAA', measure: 'margin', own: 0.35, holds: 0.35 });
    expect((await list()).body.network.at(-1)).toEqual({ measure: 'margin', value: 0.4 });
  });

  it('given changes, has each in the trail with before and after, and the same again not', async () => {
    await ofNetwork('margin', 0.4);
    await ofNetwork('margin', 0.4);
    await ofNetwork('claims', 0);
    await ofNetwork('claims', null);
    await ofBranch('BBB', 'product', 1.05);
    await ofBranch('BBB', 'product', 1.05);
    expect(trail('target.network')).toEqual([
      ['/targets/margin', { before: { margin: null }, after: { margin: 0.4 } }],
      ['/targets/claims', { before: { claims: null }, after: { claims: 0 } }],
      ['/targets/claims', { before: { claims: 0 }, after: { claims: null } }],
    ]);
    expect(trail('target.branch')).toEqual([
      ['/branches/BBB/targets/product', { before: { product: null }, after: { product: 1.05 } }],
    ]);
  });

  it.each([
    ['margin', 1],
    ['margin', 35],
    ['margin', -0.1],
    ['overrun', 0],
    ['overrun', 15],
    ['product', 0],
    ['claims', -1],
    ['claims', '3'],
    ['overrun', 'NaN'],
  ])(
    'given a target of %s of %p, is refused at /value and nothing is kept',
    async (measure, value) => {
      for (const answer of [
        await ofNetwork(measure, value),
        await ofBranch('AAA', measure, value),
      ]) {
        expect([answer.status, answer.body.problems[0].path]).toEqual([422, '/value']);
      }
      const { body } = await list(network.lead);
      expect(JSON.stringify(body)).not.toMatch(/(value|own|holds)":[^n]/);
    },
  );

  it('given rot or a measure that is none, there is nothing to set', async () => {
    for (const measure of ['rot', 'nonsense']) {
      expect([404, 422]).toContain((await ofNetwork(measure, 0.5)).status);
      expect([404, 422]).toContain((await ofBranch('AAA', measure, 0.5)).status);
    }
  });

  it('given who asks, head office sets the network, a lead the branches of their regions', async () => {
    for (const token of [network.lead, network.manager, network.recorder]) {
      expect((await ofNetwork('overrun', 1.1, token)).status).toBe(403);
    }
    for (const token of [network.manager, network.recorder]) {
      expect((await ofBranch('AAA', 'overrun', 1.1, token)).status).toBe(403);
    }
    expect((await ofBranch('CCC', 'overrun', 1.1)).status).toBe(404);
    expect((await ofBranch('CCC', 'overrun', 1.1, network.office)).status).toBe(200);
    expect((await list(network.recorder)).status).toBe(403);
    expect((await list()).text).not.toContain('CCC');
  });
});
