import { parse } from 'csv-parse/sync';
import { TestApp } from '../support/app';
import { oldClaim } from '../support/disturb-outside';
import { BRANCHES, makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start({ now: '2026-02-02T06:30:00Z' });
  network = await makeSmallNetwork(app);
}, 30_000);
afterAll(() => app.stop());

const get = (path: string, token = network.office) => app.call('get', path, { token });
const warranty = (query = '', token = network.office) =>
  get(`/api/analytics/warranty${query}`, token);

/** Sends cars of a branch, one a day named. */
async function send(branch: string, days: readonly string[], over: object = {}): Promise<void> {
  const jobs = days.map((completedOn) => ({
    jobRef: completedOn,
    ...validJob({ bookedOn: undefined, startedOn: undefined, invoice: null, completedOn, ...over }),
  }));
  const path = `/api/branches/${branch}/jobs/batch`;
  const { status, body } = await app.call('post', path, { token: network.office, body: { jobs } });
  expect([status, body.counts.rejected]).toEqual([200, 0]);
}

async function claim(branch: string, ref: string, body: object): Promise<void> {
  const path = `/api/branches/${branch}/claims/${ref}`;
  const { status } = await app.call('put', path, { token: network.office, body });
  expect(status).toBeLessThan(300);
}

/** The rows of an export. */
async function exported(name: string, query = ''): Promise<Record<string, string>[]> {
  const { status, text } = await get(`/api/exports/${name}.csv${query}`);
  expect(status).toBe(200);
  return parse(text, { columns: true });
}

describe('GET /api/analytics/warranty', () => {
  it('given an empty network, answers as of today with nothing to say', async () => {
    const { status, body } = await warranty();
    expect(status).toBe(200);
    expect(body).toMatchObject({
      period: { from: '2026-02-02', to: '2026-02-02' },
      ...{ jobs: 0, asOf: '2026-02-02', evaluatedOn: '2025-12-31', covered: 0 },
      rate: { claims: 0, carYears: 0, per1000: null, lower: null, upper: null },
      ...{ claimFree: [], groups: [], everyGroup: [], logRank: null, cohorts: [], branches: [] },
      total: { latestCents: 0, ultimateCents: 0, outstandingCents: 0, standardErrorCents: null },
      ...{ triangle: { rows: [], factors: [] }, expectedRates: [] },
    });
    expect(body.process).toHaveLength(6);
    expect(body.zones).toHaveLength(15);
  });

  it('given a void job, has its claims leave and come back with it (rules 25 and 59)', async () => {
    await send('AAA', ['2022-06-15']);
    await claim('AAA', 'c-1', oldClaim('2022-06-15', 12_345));
    const seen = async () => {
      const { body } = await warranty();
      return [body.jobs, body.rate.claims, body.total.latestCents];
    };
    expect(await seen()).toEqual([1, 1, 12_345]);
    const job = '/api/branches/AAA/jobs/2022-06-15';
    expect((await app.call('delete', job, { token: network.office })).status).toBe(204);
    expect(await seen()).toEqual([0, 0, 0]);
    await send('AAA', ['2022-06-15'], { notes: 'back again' });
    expect(await seen()).toEqual([1, 1, 12_345]);
  });

  it('given a day in the past, tells what it knew then by the dates of things (rules 14 and 18)', async () => {
    await send('AAA', ['2024-08-31', '2025-03-01']);
    await claim('AAA', 'refused', {
      ...oldClaim('2022-06-15', 100),
      ...{ decision: 'refused', decidedOn: '2023-05-01', paidOn: undefined },
    });
    const { body } = await warranty('?asOf=2023-04-30');
    expect(body).toMatchObject({
      period: { from: '2022-06-15', to: '2023-04-30' },
      ...{ jobs: 1, asOf: '2023-04-30', evaluatedOn: '2022-12-31' },
      // Paid after the last half-year's end, so not in the triangle; refused later, so counted.
      rate: { claims: 2 },
      total: { latestCents: 0 },
      left: { claimsRefused: 0, paidAfterEvaluationCents: 12_345 },
    });
    expect(body.cohorts.map((row: { cohort: string }) => row.cohort)).toEqual([
      '2022-H1',
      '2022-H2',
    ]);
    const now = (await warranty()).body;
    expect(now).toMatchObject({ jobs: 3, rate: { claims: 1 }, left: { claimsRefused: 1 } });
    expect(now.cohorts).toHaveLength(8);
    // Cars completed later are out, however far the period reaches.
    expect((await warranty('?asOf=2024-12-31&to=2026-01-01')).body).toMatchObject({
      period: { from: '2022-06-15', to: '2026-01-01' },
      jobs: 2,
    });
  });

  it('given what cannot be asked, names each (rule 60)', async () => {
    for (const [query, ...paths] of [
      ['?asOf=2026-02-03', '/query/asOf'],
      ['?asOf=2026-02-30', '/query/asOf'],
      ['?asOf=2025-01-01&from=2025-01-02', '/query/from', '/query/to'],
      ['?groupBy=zone', '/query/groupBy'],
      ['?group=a&group=b&group=c&group=d&group=e', '/query/group'],
      ['?package=none', '/query/package'],
      ['?bodyType=boat', '/query/bodyType'],
      ['?by=zone', '/query/by'],
    ] as const) {
      const { status, body } = await warranty(query);
      const named = body.problems.map(({ path }: { path: string }) => path);
      expect([query, status, named]).toEqual([query, 422, paths]);
    }
  });

  it('given a role, answers those who read analytics of their own branches only', async () => {
    await send('BBB', ['2022-06-15']);
    await send('CCC', ['2022-06-15']);
    expect((await warranty('', network.recorder)).status).toBe(403);
    const jobs = async (token: string) => (await warranty('', token)).body.jobs as number;
    expect(await jobs(network.manager)).toBe(3);
    expect(await jobs(network.lead)).toBe(4);
    expect(await jobs(network.office)).toBe(5);
    expect((await get('/api/exports/warranty-risk.csv', network.lead)).status).toBe(403);
  });

  it('given filters, counts what fits and takes a code out of scope for none (rule 22)', async () => {
    const jobs = async (query: string) => (await warranty(query, network.lead)).body.jobs as number;
    expect(await jobs('?branch=BBB')).toBe(1);
    expect(await jobs('?region=COAST&branch=AAA&branch=BBB')).toBe(4);
    expect(await jobs('?package=cavity')).toBe(0);
    expect(await jobs('?from=2023-01-01')).toBe(2);
    const outside = (await warranty('?branch=CCC', network.lead)).text;
    expect(outside).toBe((await warranty('?branch=ZZZ', network.lead)).text);
    expect(JSON.parse(outside)).toMatchObject({ jobs: 0, scope: { branches: [] } });
  });

  it('given groups, shows those asked for and names them all', async () => {
    const { body } = await warranty('?groupBy=branch&group=CCC&group=AAA&group=ZZZ');
    const keys = (rows: { key: string }[]) => rows.map(({ key }) => key);
    expect(keys(body.groups)).toEqual(['AAA', 'CCC']);
    expect(keys(body.everyGroup)).toEqual(['AAA', 'BBB', 'CCC']);
  });

  it('given five others with cars, expects what the network does, given four what the scope does (rules 21 and 81)', async () => {
    const told = async (query = '') => {
      const { body } = await warranty(query, network.lead);
      const [cell] = body.expectedRates;
      return [body.reference, cell.claims, Math.round(cell.carYears * 365.25)];
    };
    // Three cars of the one age stand in the first year of a full warranty: those of AAA and BBB of 2022.
    expect((await told())[0]).toBe('scope');
    for (const branch of ['DDD', 'EEE', 'FFF']) await send(branch, ['2022-06-15']);
    const [kind, , scopeDays] = await told();
    expect(kind).toBe('scope');
    await send('GGG', ['2022-06-15']);
    const [wider, , networkDays] = await told();
    expect(wider).toBe('network');
    // Five cars more with a whole first year each.
    expect(networkDays - scopeDays).toBe(5 * 365);
    // What rows are compared with does not change with the rows chosen.
    expect((await told('?branch=BBB'))[2]).toBe(networkDays);
    // The sums of a cell with four others behind it are withheld, and still expected by.
    const vehicle = { ...(validJob()['vehicle'] as object), firstRegistered: '2020-01' };
    for (const branch of ['AAA', 'CCC']) await send(branch, ['2022-07-01'], { vehicle });
    const { body } = await warranty('', network.lead);
    const young = body.expectedRates.find((one: { ageBand: string }) => one.ageBand === '0-4');
    expect(young).toMatchObject({ claims: null, carYears: null, yearInService: 1 });
    expect(young.ownCarYears).toBeCloseTo(365 / 365.25, 12);
  });
});

describe('The files of warranty', () => {
  it('given the same question, hold the rows of the answer (rule 62)', async () => {
    const { body } = await warranty();
    const figures = (rows: Record<string, string>[], column: string) =>
      rows.map((row) => (row[column] === '' ? null : Number(row[column])));
    const cohorts = await exported('warranty-cohorts');
    expect(figures(cohorts, 'latestCents')).toEqual(
      body.cohorts.map((row: { latestCents: number }) => row.latestCents),
    );
    const branches = await exported('warranty-branches');
    expect(figures(branches, 'expected')).toEqual(
      body.branches.map((row: { expected: number }) => row.expected),
    );
    const triangle = await exported('warranty-triangle');
    expect(triangle).toHaveLength((8 * 9) / 2);
    expect(triangle[7]).toEqual({ cohort: '2022-H1', development: '7', cumulativeCents: '12345' });
    const months = await exported('warranty-claim-free');
    expect(months.filter(({ group }) => group === '')).toHaveLength(body.claimFree.length);
    expect(months.filter(({ group }) => group === 'full')).toHaveLength(body.claimFree.length);
    expect((await exported('warranty-process')).map(({ check }) => check)).toEqual(
      body.process.map((row: { check: string }) => row.check),
    );
  });

  it('given rows of risk, has the columns of rule 51, adds up to the network and to its own choice', async () => {
    const { text } = await get('/api/exports/warranty-risk.csv');
    expect(text.split('\r\n')[0]).toBe(
      'branch,cohort,carsCovered,carYearsRun,carYearsLeft,claims,paidCents,per1000,lower,upper,expected,ratio,outstandingCents,standardErrorCents,claimsOpen',
    );
    await claim('BBB', 'late', {
      ...oldClaim('2022-06-15', 777),
      ...{ madeOn: '2025-01-01', decidedOn: '2025-01-01', paidOn: '2025-07-01' },
    });
    await send('DDD', ['2023-02-01', '2023-08-01', '2024-02-01']);
    for (const on of ['2023-02-01', '2023-08-01', '2024-02-01']) {
      const day = `${Number(on.slice(0, 4)) + 1}${on.slice(4)}`;
      await claim('DDD', on, { ...oldClaim(on, 333), madeOn: day, decidedOn: day, paidOn: day });
    }
    const rows = await exported('warranty-risk');
    const { body } = await warranty();
    for (const { cohort, outstandingCents } of body.cohorts) {
      const ofCohort = rows.filter((row) => row['cohort'] === cohort);
      const sum = ofCohort.reduce((all, row) => all + Number(row['outstandingCents']), 0);
      if (ofCohort.length > 0) expect([cohort, sum]).toEqual([cohort, outstandingCents]);
    }
    expect(body.total.outstandingCents).toBeGreaterThan(0);
    const chosen = await exported('warranty-risk', '?branch=DDD&branch=ZZZ');
    expect(chosen).toEqual(rows.filter(({ branch }) => branch === 'DDD'));
    expect(await exported('warranty-risk', '?region=COAST')).toEqual(
      rows.filter(({ branch }) => BRANCHES.some(([code, at]) => code === branch && at === 'COAST')),
    );
    const last = (await get('/api/audit?action=export.warranty-risk')).body.items;
    expect(last).toHaveLength(4);
    expect(last[0].detail.branches).toEqual(['AAA', 'BBB']);
  });
});
