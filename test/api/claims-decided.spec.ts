import { TestApp, type Answer } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
  const path = '/api/branches/AAA/jobs/job';
  await app.call('put', path, { token: network.manager, body: validJob() });
});
afterAll(() => app.stop());

let next = 0;
const fresh = (): string => `decided-${(next += 1)}`;
const at = (ref: string): string => `/api/branches/AAA/claims/${ref}`;
const CLAIM = {
  jobRef: 'job',
  madeOn: '2026-01-29',
  zone: 'floor',
  cause: 'missed_area',
  labourMinutes: 30,
  productMl: 0,
};
const put = (
  ref: string,
  token: string,
  decision: string,
  costCents?: number,
  more: object = {},
): Promise<Answer> =>
  app.call('put', at(ref), {
    token,
    body: { ...CLAIM, decision, ...(costCents !== undefined && { costCents }), ...more },
  });
const standing = async (ref: string): Promise<unknown[]> => {
  const { body } = await app.call('get', at(ref), { token: network.office });
  return [body.decision, body.proposedDecision ?? null, body.costCents];
};
const limit = async (claimLimitCents: number | null): Promise<void> => {
  const body = { name: 'Small', currency: 'EUR', feeRate: 0.05, claimLimitCents };
  const answer = await app.call('put', '/api/network', { token: network.office, body });
  if (answer.status !== 200) throw new Error(answer.text);
};

describe('A recorder’s claim (rule 77)', () => {
  it('given open, is taken; given a decision, is refused with 403 and stores nothing', async () => {
    const ref = fresh();
    for (const decision of ['accepted', 'goodwill', 'refused']) {
      expect((await put(ref, network.recorder, decision)).status).toBe(403);
    }
    expect((await app.call('get', at(ref), { token: network.manager })).status).toBe(404);
    expect((await put(ref, network.recorder, 'open')).status).toBe(201);
  });

  it('given a decided claim, keeps decision and cost whichever of both words is sent', async () => {
    const ref = fresh();
    await put(ref, network.manager, 'accepted', 700);
    const same = await put(ref, network.recorder, 'accepted');
    expect(same.body).toMatchObject({ status: 'unchanged', decision: 'accepted' });
    expect((await put(ref, network.recorder, 'open')).body).toMatchObject({
      status: 'unchanged',
      decision: 'accepted',
    });
    expect((await put(ref, network.recorder, 'refused')).status).toBe(403);
    const more = await put(ref, network.recorder, 'open', undefined, { labourMinutes: 45 });
    expect(more.body).toMatchObject({ status: 'replaced', decision: 'accepted' });
    expect(await standing(ref)).toEqual(['accepted', null, 700]);
    const pushed = await put(ref, network.keys['AAA']!, 'accepted', 700, { labourMinutes: 45 });
    expect(pushed.body.status).toBe('unchanged');
  });

  it('given a batch, names the decision and keeps the others', async () => {
    const claims = ['accepted', 'open'].map((decision) => ({
      claimRef: fresh(),
      ...CLAIM,
      decision,
    }));
    const path = '/api/branches/AAA/claims/batch';
    const { status, body } = await app.call('post', path, {
      token: network.recorder,
      body: { claims },
    });
    expect([status, body.counts]).toMatchObject([200, { created: 1, rejected: 1 }]);
    expect(body.results[0].problems[0].path).toBe('/decision');
  });
});

describe('A claim without a limit of the network (rule 77)', () => {
  it('given any cost, is decided by manager and push key', async () => {
    for (const token of [network.manager, network.keys['AAA']!]) {
      const ref = fresh();
      await put(ref, token, 'goodwill', 1_000_000_000);
      expect(await standing(ref)).toEqual(['goodwill', null, 1_000_000_000]);
    }
  });
});

describe('A claim with a limit of the network (rule 77)', () => {
  beforeAll(() => limit(10_000));
  afterAll(() => limit(null));

  it('given a cost up to the limit, is decided by manager and push key', async () => {
    for (const token of [network.manager, network.keys['AAA']!]) {
      const ref = fresh();
      const answer = await put(ref, token, 'accepted', 10_000);
      expect(answer.body).toEqual({
        claimRef: ref,
        revision: 1,
        status: 'created',
        decision: 'accepted',
      });
    }
  });

  it('given a cost above it, stays open with the proposal until head office decides', async () => {
    const ref = fresh();
    const answer = await put(ref, network.keys['AAA']!, 'accepted', 10_001);
    expect(answer.body).toMatchObject({ decision: 'open', proposedDecision: 'accepted' });
    expect(await standing(ref)).toEqual(['open', 'accepted', 10_001]);
    const again = await put(ref, network.keys['AAA']!, 'accepted', 10_001);
    expect(again.body).toMatchObject({ status: 'unchanged', proposedDecision: 'accepted' });
    await put(ref, network.office, 'accepted', 10_001);
    expect(await standing(ref)).toEqual(['accepted', null, 10_001]);
    expect((await put(ref, network.keys['AAA']!, 'accepted', 10_001)).body).toMatchObject({
      status: 'unchanged',
      decision: 'accepted',
    });
  });

  it('given head office against the proposal, keeps its word against a nightly push', async () => {
    const ref = fresh();
    await put(ref, network.keys['AAA']!, 'accepted', 20_000);
    await put(ref, network.office, 'refused', 20_000);
    await put(ref, network.keys['AAA']!, 'accepted', 20_000);
    expect(await standing(ref)).toEqual(['refused', 'accepted', 20_000]);
    expect((await put(ref, network.keys['AAA']!, 'accepted', 20_000)).body.status).toBe(
      'unchanged',
    );
  });

  it('given a push that knows of no decision, does not undo that of head office', async () => {
    const ref = fresh();
    await put(ref, network.keys['AAA']!, 'open', 20_000);
    await put(ref, network.office, 'refused', 20_000);
    await put(ref, network.keys['AAA']!, 'open', 20_000);
    expect(await standing(ref)).toEqual(['refused', null, 20_000]);
  });

  it('given a cost raised above it after the decision, waits for head office again', async () => {
    for (const decide of [network.manager, network.office]) {
      const ref = fresh();
      const decided = decide === network.manager ? 5_000 : 50_000;
      await put(ref, decide, 'accepted', decided);
      const raised = await put(ref, network.manager, 'accepted', 60_000);
      expect(raised.body).toMatchObject({ decision: 'open', proposedDecision: 'accepted' });
      expect(await standing(ref)).toEqual(['open', 'accepted', 60_000]);
    }
  });

  it('given a cost raised by a recorder, waits for head office too', async () => {
    const ref = fresh();
    await put(ref, network.manager, 'accepted', 5_000);
    await put(ref, network.recorder, 'accepted', 999_999);
    expect(await standing(ref)).toEqual(['open', 'accepted', 999_999]);
    // What waits stays waiting, whatever a recorder sends of it.
    await put(ref, network.recorder, 'open', undefined, { labourMinutes: 31 });
    expect(await standing(ref)).toEqual(['open', 'accepted', 999_999]);
  });

  it('given a cost that head office accepted and a manager lowers, stays accepted', async () => {
    const ref = fresh();
    await put(ref, network.office, 'accepted', 50_000);
    await put(ref, network.manager, 'accepted', 40_000);
    expect(await standing(ref)).toEqual(['accepted', null, 40_000]);
  });

  it('given another decision proposed at a higher cost, does not count that cost as decided', async () => {
    const ref = fresh();
    await put(ref, network.manager, 'accepted', 5_000);
    await put(ref, network.manager, 'goodwill', 70_000);
    expect(await standing(ref)).toEqual(['open', 'goodwill', 70_000]);
  });

  it('given a payment of a claim that waits, keeps the proposal and counts the payment once it is decided', async () => {
    const paidOn = (ref: string): unknown =>
      app.kit.store.writing
        .prepare('select paid_on from claims where claim_ref = ?')
        .pluck()
        .get(ref);
    const more = { paidOn: '2026-01-31' };
    const ref = fresh();
    const answer = await put(ref, network.manager, 'accepted', 20_000, more);
    expect(answer.status).toBe(201);
    expect(await standing(ref)).toEqual(['open', 'accepted', 20_000]);
    expect(paidOn(ref)).toBeNull();
    await put(ref, network.office, 'accepted', 20_000, more);
    expect(await standing(ref)).toEqual(['accepted', null, 20_000]);
    expect(paidOn(ref)).toBe('2026-01-31');
  });

  it('given an open claim of any cost, needs nobody', async () => {
    const ref = fresh();
    await put(ref, network.manager, 'open', 900_000);
    expect(await standing(ref)).toEqual(['open', null, 900_000]);
  });
});

describe('Who may send claims (rule 23)', () => {
  it('given a lead, is refused', async () => {
    expect((await put(fresh(), network.lead, 'open')).status).toBe(403);
  });
});
