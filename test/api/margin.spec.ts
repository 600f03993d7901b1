import { TestApp } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  // A Monday morning: the week before is over.
  app = await TestApp.start({ now: '2026-02-02T06:30:00Z' });
  network = await makeSmallNetwork(app);
});
afterAll(() => app.stop());

const margin = (query: string, token = network.manager) =>
  app.call('get', `/api/analytics/margin${query}`, { token });
const put = async (ref: string, over: Record<string, unknown> = {}, branch = 'AAA') => {
  const path = `/api/branches/${branch}/jobs/${encodeURIComponent(ref)}`;
  const answer = await app.call('put', path, {
    token: network.keys[branch],
    body: validJob(over),
  });
  expect(answer.status).toBeLessThan(300);
};

describe('GET /api/analytics/margin', () => {
  it('given the example job pushed with a key, has it in its week on Monday morning', async () => {
    await put('0417');
    const { status, body } = await margin('?from=2026-01-26&to=2026-02-01');
    expect(status).toBe(200);
    // 735 minutes at 36.00 an hour, 4.2 l at 12.00, six clips at 0.45, 5 % of 870.00.
    expect(body.weeks).toEqual([
      {
        week: '2026-W05',
        jobs: 1,
        unbilled: 0,
        unbilledCostCents: 0,
        revenueCents: 87_000,
        labourCents: 44_100,
        productCents: 5_040,
        consumablesCents: 270,
        boughtInCents: 0,
        feeCents: 4_350,
        marginCents: 33_240,
        marginShare: 33_240 / 87_000,
        expectedMarginCents: 45_000,
        signal: null,
        whole: true,
      },
    ]);
    expect(body.bridge).toEqual({
      cars: 1,
      expectedMarginCents: 45_000,
      priceCents: 9_000,
      plannedLabourCents: -8_700,
      rotLabourCents: -11_100,
      productCents: -240,
      consumablesCents: -270,
      feeCents: -450,
      marginCents: 33_240,
    });
    expect(body).toMatchObject({
      period: { from: '2026-01-26', to: '2026-02-01' },
      scope: { regions: ['COAST'], branches: ['AAA'] },
      jobs: 1,
      withoutCost: 0,
      missingCosts: [],
    });
  });

  it('given no period, answers the 52 weeks up to today, whose last is not over (rule 9)', async () => {
    const { body } = await margin('');
    expect(body.period).toEqual({ from: '2025-02-10', to: '2026-02-02' });
    expect(body.weeks).toHaveLength(52);
    expect(body.weeks[0]).toMatchObject({ week: '2025-W07', whole: true });
    expect(body.weeks[51]).toMatchObject({ week: '2026-W06', whole: false });
  });

  it('given a correction and a void, follows the newest revision only', async () => {
    const [startedOn, completedOn] = ['2026-01-13', '2026-01-19'];
    await put('moves', { startedOn, completedOn, invoice: { totalCents: 1 } });
    await put('moves', { startedOn, completedOn, invoice: { totalCents: 70_000 } });
    const asked = '?from=2026-01-19&to=2026-01-25';
    expect((await margin(asked)).body.weeks[0]).toMatchObject({ jobs: 1, revenueCents: 70_000 });
    const path = '/api/branches/AAA/jobs/moves';
    expect((await app.call('delete', path, { token: network.manager })).status).toBe(204);
    expect((await margin(asked)).body.weeks[0]).toMatchObject({ jobs: 0, revenueCents: 0 });
  });

  it('given an hourly cost that changes, restates the weeks it touches before it is answered', async () => {
    await put(
      'dear',
      { completedOn: '2025-06-03', bookedOn: undefined, startedOn: undefined },
      'BBB',
    );
    const asked = '?from=2025-06-02&to=2025-06-08&branch=BBB';
    const before = (await margin(asked, network.office)).body.weeks[0];
    const path = '/api/branches/BBB/rates/2025-06-01';
    await app.call('put', path, { token: network.office, body: { hourlyCostCents: 4800 } });
    const after = (await margin(asked, network.office)).body.weeks[0];
    expect([before.labourCents, after.labourCents]).toEqual([44_100, 58_800]);
  });

  it('given filters, narrows by all of them; codes outside the scope match nothing (rule 22)', async () => {
    await put('cav', { package: 'cavity', completedOn: '2026-01-14', startedOn: '2026-01-13' });
    await put('other', { completedOn: '2026-01-14', startedOn: '2026-01-13' }, 'BBB');
    const week = '?from=2026-01-12&to=2026-01-18';
    const jobs = async (query: string, token = network.lead) =>
      (await margin(`${week}${query}`, token)).body.jobs;
    expect(await jobs('')).toBe(2);
    expect(await jobs('&package=cavity')).toBe(1);
    expect(await jobs('&package=cavity&package=full')).toBe(2);
    expect(await jobs('&bodyType=hatchback&branch=BBB')).toBe(1);
    expect(await jobs('&bodyType=van')).toBe(0);
    expect(await jobs('&branch=BBB', network.manager)).toBe(0);
    const outside = (await margin(`${week}&branch=CCC`)).body;
    const nowhere = (await margin(`${week}&branch=NOPE`)).body;
    expect(outside).toEqual(nowhere);
    expect(outside.scope).toEqual({ regions: [], branches: [] });
  });

  it.each([
    ['?from=2026-01-02&to=2026-01-01', ['/query/from', '/query/to']],
    ['?to=2020-01-01', ['/query/from', '/query/to']],
    ['?from=1000-01-01&to=2026-01-01', ['/query/from']],
    ['?from=2026-02-30', ['/query/from']],
    ['?package=nothing', ['/query/package']],
    ['?bodyType=boat', ['/query/bodyType']],
    ['?form=2026-01-01', ['/query/form']],
  ])('given %s, is refused with every field named', async (query, paths) => {
    const { status, body } = await margin(query);
    expect(status).toBe(422);
    expect(body.problems.map(({ path }: { path: string }) => path)).toEqual(paths);
  });

  it('given a target of the network and one of the branch, tells the one that holds (rule 80)', async () => {
    const token = network.office;
    const set = (path: string, body: object) => app.call('put', path, { token, body });
    await set('/api/network', {
      name: 'Small',
      currency: 'EUR',
      feeRate: 0.05,
      targetMarginShare: 0.35,
    });
    await set('/api/branches/BBB', {
      name: 'Branch BBB',
      region: 'COAST',
      timeZone: 'Europe/Berlin',
      openedOn: '2015-01-01',
      targetMarginShare: 0.42,
    });
    const target = async (query: string) => (await margin(query, token)).body.targetMarginShare;
    expect(await target('')).toBe(0.35);
    expect(await target('?branch=BBB')).toBe(0.42);
    expect(await target('?branch=AAA')).toBe(0.35);
  });
});
