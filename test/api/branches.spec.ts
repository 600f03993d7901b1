import { parse } from 'csv-parse/sync';
import type { BranchStanding, ComparedBranch } from '#shared/contracts/branches';
import { BRANCH_MEASURES } from '#shared/domain/vocabulary';
import { TestApp } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start({ now: '2026-02-02T06:30:00Z' });
  network = await makeSmallNetwork(app);
}, 30_000);
afterAll(() => app.stop());

const get = (path: string, token = network.lead) => app.call('get', path, { token });
const branches = (query = '', token = network.lead) =>
  get(`/api/analytics/branches${query}`, token);
/** Sends cars of a branch, each with minutes of stripping of its own. */
async function send(branch: string, minutes: readonly number[], over: object = {}): Promise<void> {
  const jobs = minutes.map((strip, n) => ({
    jobRef: `b-${Object.keys(over).join()}-${n}`,
    ...validJob({ actual: { stages: { strip, repair: 185 } }, ...over }),
  }));
  const path = `/api/branches/${branch}/jobs/batch`;
  const { status, body } = await app.call('post', path, { token: network.office, body: { jobs } });
  expect([status, body.counts.rejected]).toEqual([200, 0]);
}

describe('GET /api/analytics/branches', () => {
  it('given an empty network, has no branch to place and says that none has sent anything', async () => {
    const { status, body } = await branches('', network.office);
    expect(status).toBe(200);
    expect(body).toMatchObject({
      period: { from: '2025-02-10', to: '2026-02-02' },
      ...{ jobs: 0, measure: 'overrun', reference: 'network', network: null, referenceCars: 0 },
      ...{ withoutCost: 0, missingCosts: [], branches: [] },
    });
    expect(body.received).toHaveLength(8);
    expect(body.received[0]).toEqual({
      ...{ branch: 'AAA', region: 'COAST', receivedThrough: null, lastReceivedAt: null },
    });
    expect((await branches()).body).toMatchObject({ reference: 'scope', network: null });
  });

  it('given four cars at a branch, counts them and keeps their value back but for margin and claims (rule 13)', async () => {
    await send('AAA', [200, 220, 240, 260]);
    const of = async (measure: string) =>
      (await branches(`?measure=${measure}`)).body.branches[0] as BranchStanding;
    for (const measure of ['overrun', 'rot', 'product']) {
      expect(await of(measure)).toMatchObject({
        ...{ branch: 'AAA', cars: 4, value: null, expected: null, upper95: null },
        flag: 'too_few',
      });
    }
    // 870.00 less 385 to 445 minutes at 0.60, 50.40 of product, 2.70 of clips and 43.50 of fee, over four cars.
    const spent = (385 + 405 + 425 + 445) * 60 + 4 * (5040 + 270 + 4350);
    const margin = await of('margin');
    expect(margin).toMatchObject({ cars: 4, expected: null, flag: 'too_few' });
    expect(margin.denominator).toBe(4 * 87_000);
    expect(margin.value).toBeCloseTo(1 - spent / (4 * 87_000), 12);
    // Five days of cover each.
    const claims = await of('claims');
    expect(claims).toMatchObject({ cars: 4, value: 0, claims: 0, flag: 'too_few' });
    expect(claims.denominator).toBeCloseTo((4 * 5) / 365.25, 12);
  });

  it('given a role, answers those who read analytics, each of their own branches only', async () => {
    await send('AAA', [280, 300], { notes: 'more' });
    await send('BBB', [300, 300, 300, 300, 300, 300]);
    await send('CCC', [400, 410, 420, 430, 440]);
    const shown = async (token: string) =>
      ((await branches('', token)).body.branches as BranchStanding[]).map(({ branch }) => branch);
    for (const path of ['', '/weeks', '/side-by-side']) {
      expect((await get(`/api/analytics/branches${path}`, network.recorder)).status).toBe(403);
    }
    expect((await get('/api/exports/branches.csv', network.recorder)).status).toBe(403);
    expect(await shown(network.manager)).toEqual(['AAA']);
    expect(await shown(network.lead)).toEqual(['AAA', 'BBB']);
    expect(await shown(network.office)).toEqual(['AAA', 'BBB', 'CCC']);
  });

  it('given filters, places what fits and takes a code out of scope for none (rule 22)', async () => {
    expect((await branches('?branch=BBB')).body).toMatchObject({ jobs: 6, referenceCars: 12 });
    expect((await branches('?package=cavity')).body).toMatchObject({ jobs: 0, branches: [] });
    const outside = (await branches('?branch=CCC')).text;
    expect(outside).toBe((await branches('?branch=ZZZ')).text);
    expect(JSON.parse(outside)).toMatchObject({ jobs: 0, branches: [], received: [] });
    // How far a record reaches does not hang on the days asked for.
    expect((await branches('?from=2020-01-01&to=2020-01-02')).body).toMatchObject({
      ...{ jobs: 0, branches: [] },
      received: [{ receivedThrough: '2026-01-28' }, { receivedThrough: '2026-01-28' }],
    });
  });

  it.each(['', '/weeks', '/side-by-side'])(
    'given a word or parameter that %s does not know, names it',
    async (path) => {
      for (const [query, named] of [
        ['?measure=speed', '/query/measure'],
        ['?by=zone', '/query/by'],
        ['?package=none', '/query/package'],
        ['?from=2026-02-01&to=2026-01-01', '/query/from'],
      ] as const) {
        const { status, body } = await get(`/api/analytics/branches${path}${query}`);
        expect([query, status]).toEqual([query, 422]);
        expect(body.problems[0]).toMatchObject({ path: named });
      }
    },
  );

  it('given four branches with cars outside, compares within the scope, given five, with the network (rule 21)', async () => {
    // Twelve cars of one kind: 385 … 485 and six times 485 minutes over twelve times 405.
    const own = [385, 405, 425, 445, 465, 485].reduce((sum, one) => sum + one, 0);
    for (const branch of ['DDD', 'EEE', 'FFF']) await send(branch, [500, 500]);
    const before = await branches();
    expect(before.body).toMatchObject({ reference: 'scope', referenceCars: 12 });
    expect(before.body.network).toBeCloseTo((own + 6 * 485) / (12 * 405), 12);
    await send('DDD', [600], { notes: 'one more' });
    expect((await branches()).text).toBe(before.text);
    await send('GGG', [500, 500]);
    const after = (await branches()).body;
    expect(after).toMatchObject({ reference: 'network', referenceCars: 26, jobs: 12 });
    const all = own + 6 * 485 + [585, 595, 605, 615, 625].reduce((sum, one) => sum + one, 0);
    expect(after.network).toBeCloseTo((all + 8 * 685 + 785) / (26 * 405), 12);
    // One kind of car only: what is expected of everybody is the network's.
    const [first] = after.branches as BranchStanding[];
    expect(first).toMatchObject({ branch: 'AAA', cars: 6, denominator: 6 * 405 });
    expect(first!.value).toBeCloseTo(own / (6 * 405), 12);
    expect(first!.expected).toBeCloseTo(after.network, 12);
    // Counted after filters: on days without cars nobody stands behind a figure.
    const billed = await branches('?measure=margin&from=2026-01-29');
    expect(billed.body).toMatchObject({ reference: 'scope', referenceCars: 0 });
  });

  it('given a target of one branch’s margin, says it there and nowhere else (rule 80)', async () => {
    const of = async (measure: string) =>
      ((await branches(`?measure=${measure}`)).body.branches as BranchStanding[]).map(
        ({ target }) => target,
      );
    expect(await of('overrun')).toEqual([null, null]);
    const own = { name: 'Branch AAA', region: 'COAST', timeZone: 'Europe/Berlin' };
    const body = { ...own, openedOn: '2015-01-01', targetMarginShare: 0.45 };
    const path = '/api/branches/AAA';
    expect((await app.call('put', path, { token: network.office, body })).status).toBe(200);
    expect(await of('margin')).toEqual([0.45, null]);
    expect(await of('rot')).toEqual([null, null]);
  });
});

describe('GET /api/analytics/branches/side-by-side', () => {
  it.each(BRANCH_MEASURES)(
    'given %s, its steps lead from the network to the value',
    async (measure) => {
      const { status, body } = await get(`/api/analytics/branches/side-by-side?measure=${measure}`);
      expect([status, body.measure, body.reference]).toEqual([200, measure, 'network']);
      const rows = body.branches as ComparedBranch[];
      expect(rows.map(({ branch }) => branch)).toEqual(['AAA', 'BBB']);
      for (const { value, steps } of rows) {
        expect(steps?.[0]?.key).toBe('mix');
        const end = steps!.reduce<number>((sum, step) => sum + step.value, body.network);
        expect(end).toBeCloseTo(value!, 10);
      }
      const standing = (await branches(`?measure=${measure}`)).body.branches as BranchStanding[];
      expect(rows.map(({ value, expected, flag }) => [value, expected, flag])).toEqual(
        standing.map(({ value, expected, flag }) => [
          near(value, measure),
          near(expected, measure),
          flag,
        ]),
      );
    },
  );

  it('given margin, tells lines of cost and leaves revenue out, whose step is always 0', async () => {
    const { body } = await get('/api/analytics/branches/side-by-side?measure=margin&branch=AAA');
    const [row] = body.branches as ComparedBranch[];
    expect(row!.steps!.map(({ key }) => key)).toEqual([
      ...['mix', 'plannedLabour', 'rotLabour', 'product', 'consumables', 'fee'],
    ]);
  });

  it('given product, tells the products of a norm by their codes', async () => {
    const { body } = await get('/api/analytics/branches/side-by-side?measure=product&branch=AAA');
    const [row] = body.branches as ComparedBranch[];
    expect(row!.steps!.map(({ key }) => key)).toEqual(['mix', 'CW1']);
  });
});

describe('GET /api/exports/branches.csv', () => {
  it.each(BRANCH_MEASURES)('given %s, has the rows of the answer', async (measure) => {
    const { status, text } = await get(`/api/exports/branches.csv?measure=${measure}`);
    expect(status).toBe(200);
    const rows = parse<Record<string, string>>(text, { columns: true });
    const told = (await branches(`?measure=${measure}`)).body.branches as BranchStanding[];
    expect(rows).toEqual(
      told.map((row) =>
        Object.fromEntries(
          Object.entries(row).map(([name, value]) => [name, value === null ? '' : String(value)]),
        ),
      ),
    );
    expect(rows).toHaveLength(2);
  });
});

/** Products told one by one add up to the same in another order. */
function near(value: number | null, measure: string): number | null {
  return value === null || measure !== 'product' ? value : (expect.closeTo(value, 12) as number);
}
