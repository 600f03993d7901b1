import { parse } from 'csv-parse/sync';
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
const rot = (query = '', token = network.lead) => get(`/api/analytics/rot${query}`, token);
/** Sends cars of a branch, each registered in the year named. */
async function send(branch: string, years: readonly number[], over: object = {}): Promise<void> {
  const vehicle = validJob()['vehicle'] as object;
  const jobs = years.map((year, n) => ({
    jobRef: `r-${Object.keys(over).join()}-${n}`,
    ...validJob({ vehicle: { ...vehicle, firstRegistered: `${year}-01` }, ...over }),
  }));
  const path = `/api/branches/${branch}/jobs/batch`;
  const { status, body } = await app.call('post', path, { token: network.office, body: { jobs } });
  expect([status, body.counts.rejected]).toEqual([200, 0]);
}

describe('GET /api/analytics/rot', () => {
  it('given an empty network, answers with its regions and nothing to say', async () => {
    const { status, body } = await rot('', network.office);
    expect(status).toBe(200);
    expect(body).toMatchObject({
      period: { from: '2025-02-10', to: '2026-02-02' },
      scope: { regions: ['COAST', 'HILLS'] },
      ...{ jobs: 0, reference: 'network', bands: [], cells: [], zones: [], models: [] },
      overall: { cars: 0, withRot: 0, share: null, lower: null, upper: null },
      regions: [{ region: 'COAST' }, { region: 'HILLS' }],
      openedUp: { worked: 0, holed: 0, share: null },
    });
    expect((await rot()).body.reference).toBe('scope');
  });

  it('given one car, counts it and withholds shares (rule 13)', async () => {
    await send('AAA', [2009], { invoice: null });
    const { body } = await rot();
    expect(body.overall).toEqual({ cars: 1, withRot: 1, share: null, lower: null, upper: null });
    expect(body.cells).toMatchObject([{ ageBand: '15-19', region: 'COAST', cars: 1, share: null }]);
    expect(body.zones).toHaveLength(15);
    expect(body.models).toMatchObject([{ make: 'Velder', cars: 1, share: null, shrunkShare: 1 }]);
    expect(body.openedUp).toEqual({ worked: 1, holed: 1, share: null, lower: null, upper: null });
  });

  it('given a role, answers those who read analytics of their own branches only', async () => {
    await send('BBB', [2009, 2022, 2022], { findings: [] });
    await send('CCC', [2009, 2022], { findings: [] });
    expect((await rot('', network.recorder)).status).toBe(403);
    const jobs = async (token: string) => (await rot('', token)).body.jobs as number;
    expect(await jobs(network.manager)).toBe(1);
    expect(await jobs(network.lead)).toBe(4);
    expect(await jobs(network.office)).toBe(6);
  });

  it('given filters, counts what fits and takes a code out of scope for none (rule 22)', async () => {
    await send('BBB', [2009], { package: 'cavity' });
    const jobs = async (query: string) => (await rot(query)).body.jobs as number;
    expect(await jobs('?package=cavity')).toBe(1);
    expect(await jobs('?bodyType=van')).toBe(0);
    expect(await jobs('?branch=BBB')).toBe(4);
    expect(await jobs('?region=COAST&branch=AAA&branch=BBB')).toBe(5);
    expect(await jobs('?from=2026-01-29')).toBe(0);
    const outside = (await rot('?branch=CCC')).text;
    expect(outside).toBe((await rot('?branch=ZZZ')).text);
    expect(JSON.parse(outside)).toMatchObject({ jobs: 0, scope: { branches: [] }, regions: [] });
  });

  it('given a word or parameter that it does not know, names it', async () => {
    for (const [query, path] of [
      ['?bodyType=boat', '/query/bodyType'],
      ['?package=none', '/query/package'],
      ['?by=zone', '/query/by'],
      ['?from=2026-02-30', '/query/from'],
    ] as const) {
      const { status, body } = await rot(query);
      expect([query, status]).toEqual([query, 422]);
      expect(body.problems).toEqual([expect.objectContaining({ path })]);
    }
  });

  it('given few cars outside, adjusts to the scope, given five branches, to the network (rule 21)', async () => {
    const coast = ({ body }: Awaited<ReturnType<typeof rot>>) => body.regions[0];
    const before = await rot();
    expect(before.body.reference).toBe('scope');
    // Two cars of 0-4 and three of 15-19, weighed by themselves: the share as it is.
    expect(coast(before)).toMatchObject({ cars: 5, withRot: 2, share: 0.4, bandsLeftOut: [] });
    expect(coast(before).adjustedShare).toBeCloseTo(0.4, 14);
    for (const branch of ['DDD', 'EEE', 'FFF']) await send(branch, [2023, 2015], { findings: [] });
    expect((await rot()).text).toBe(before.text);
    await send('GGG', [2023, 2015], { findings: [] });
    const after = await rot();
    expect(after.body.reference).toBe('network');
    expect(after.body.jobs).toBe(before.body.jobs);
    // Of the network's 15 cars 7 are of 0-4, 4 of 10-14 (none in the region), 4 of 15-19: 4/11 of two in three.
    expect(coast(after)).toMatchObject({ share: 0.4, bandsLeftOut: ['10-14'] });
    expect(coast(after).adjustedShare).toBeCloseTo((4 / 11) * (2 / 3), 14);
    // Fewer than five others have a car of 15-19; all five have one of 0-4.
    expect(after.body.bands).toMatchObject([
      { ageBand: '0-4', referenceShare: 0 },
      { ageBand: '15-19', referenceShare: null },
    ]);
    // Branch and region filters choose rows, never the reference.
    const one = await rot('?branch=BBB');
    expect(one.body).toMatchObject({ reference: 'network', jobs: 4 });
  });

  it('given a region with a climate, has its corrosion beside it (rule 36)', async () => {
    const climate = {
      temperatureC: 15,
      humidityPct: 78,
      so2Deposition: 5,
      chlorideDeposition: 200,
    };
    const body = { name: 'Coast', climate };
    await app.call('put', '/api/regions/COAST', { token: network.office, body });
    const [coast, hills] = (await rot('', network.office)).body.regions;
    // Source: ISO 9223:2012, equation (1), by secondary sources.
    expect(coast.corrosionRateUmPerYear).toBeCloseTo(79.9645888301451, 9);
    expect(coast).toMatchObject({ corrosivityCategory: 'C4', outsideFittedRange: false });
    expect(hills).toMatchObject({ corrosionRateUmPerYear: null, corrosivityCategory: null });
  });
});

describe('GET /api/exports/rot*.csv', () => {
  const rowsOf = async (name: string, query = '') => {
    const { status, text, headers } = await get(`/api/exports/${name}.csv${query}`);
    expect(status).toBe(200);
    expect(headers.get('content-type')).toMatch(/^text\/csv; charset=utf-8/);
    return parse<Record<string, string>>(text, { columns: true, record_delimiter: '\r\n' });
  };
  const asText = (row: object) =>
    Object.fromEntries(
      Object.entries(row).map(([field, value]) => [field, value === null ? '' : String(value)]),
    );

  it.each([
    ['rot', 'cells'],
    ['rot-models', 'models'],
  ])('given %s, has the %s of the screen', async (name, list) => {
    for (const query of ['', '?branch=BBB']) {
      const rows = (await rot(query)).body[list] as object[];
      expect(rows.length).toBeGreaterThan(0);
      expect(await rowsOf(name, query)).toEqual(rows.map(asText));
    }
  });

  it('given rot-zones, has a row a zone with an empty side and one a side, each of all cars of its band', async () => {
    const { zones } = (await rot()).body as { zones: { sides: object[] }[] };
    const rows = zones.flatMap(({ sides, ...zone }) => [
      { ...zone, side: null },
      ...sides.map((side) => ({ ...zone, ...side })),
    ]);
    expect(rows.length).toBeGreaterThan(60);
    expect(await rowsOf('rot-zones')).toEqual(rows.map(asText));
  });

  it('given a make that a spreadsheet would run, defuses it (rule 62)', async () => {
    const vehicle = { ...(validJob()['vehicle'] as object), make: '=1+1', model: '@x, "y"' };
    const body = validJob({ vehicle });
    await app.call('put', '/api/branches/AAA/jobs/runs', { token: network.manager, body });
    const { text } = await get('/api/exports/rot-models.csv');
    expect(text).toContain(`'=1+1,"'@x, ""y""",15-19,1,1,,`);
  });

  it('given nothing that fits or a recorder, has its header or is refused', async () => {
    for (const name of ['rot', 'rot-models', 'rot-zones']) {
      const path = `/api/exports/${name}.csv`;
      const { text } = await get(`${path}?from=2020-01-01&to=2020-01-02`);
      expect(text.split('\r\n')).toHaveLength(2);
      expect((await get(path, network.recorder)).status).toBe(403);
    }
  });
});
