import { parse } from 'csv-parse/sync';
import { sql } from '#db/database';
import { TestApp } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;

const leftAt = (seenAs: string, structural: boolean, over: object = {}) => ({
  ...{ zone: 'floor', side: 'left', seenAs, structural, action: 'deferred', ...over },
});

/** Eight findings of five cars: in the order in which the list must have them, but for two that are closed. */
const JOBS: [branch: string, ref: string, over: Record<string, unknown>][] = [
  [
    'AAA',
    'closed',
    { findings: [leftAt('holed', true), leftAt('holed', true, { side: 'right' })] },
  ],
  [
    'AAA',
    '=rest',
    { findings: [leftAt('surface', false), leftAt('bubbling', true, { zone: 'chassis_rail' })] },
  ],
  [
    'AAA',
    'holed',
    { package: 'cavity', findings: [leftAt('bubbling', false, { workedAs: 'holed' })] },
  ],
  [
    'BBB',
    'old',
    { completedOn: '2026-01-27', findings: [leftAt('bubbling', true, { workedAs: 'holed' })] },
  ],
  [
    'AAA',
    'new',
    { findings: [leftAt('holed', true), leftAt('bubbling', true, { zone: 'tailgate' })] },
  ],
  ['CCC', 'far', { findings: [leftAt('holed', true)] }],
];

beforeAll(async () => {
  app = await TestApp.start({ now: '2026-02-02T06:30:00Z' });
  network = await makeSmallNetwork(app);
  for (const [branch, ref, over] of JOBS) {
    const vehicle = { ...(validJob()['vehicle'] as object), key: `K-${ref}` };
    const path = `/api/branches/${branch}/jobs/${encodeURIComponent(ref)}`;
    const body = validJob({ vehicle, startedOn: '2026-01-26', ...over });
    const answer = await app.call('put', path, { token: network.office, body });
    expect([ref, answer.status]).toEqual([ref, 201]);
  }
  await mark('closed', 'floor/left/1', { status: 'done' });
  await mark('closed', 'floor/right/1', { status: 'gone', note: '=sold' });
  await mark('new', 'floor/left/1', { status: 'booked', ownerToldOn: '2026-01-30', note: '-x' });
});
afterAll(() => app.stop());

async function mark(job: string, ref: string, body: object): Promise<void> {
  const path = `/api/branches/AAA/come-back/${job}/${encodeURIComponent(ref)}`;
  expect((await app.call('put', path, { token: network.manager, body })).status).toBe(200);
}
const list = (query = '', token = network.office) =>
  app.call('get', `/api/come-back${query}`, { token });
const namesOf = (items: { jobRef: string; ref: string }[]) =>
  items.map(({ jobRef, ref }) => `${jobRef} ${ref}`);
const names = async (query = '', token?: string) =>
  namesOf((await list(query, token)).body.items as []);

const OPEN = [
  ...['old floor/left/1', 'new floor/left/1', 'far floor/left/1'],
  ...['=rest chassis_rail/left/1', 'new tailgate/left/1'],
  ...['holed floor/left/1', '=rest floor/left/1'],
];

describe('GET /api/come-back', () => {
  it('given no question, lists what is still to be dealt with, the dangerous first (rule 61)', async () => {
    const { status, body } = await list();
    expect(status).toBe(200);
    expect(namesOf(body.items)).toEqual(OPEN);
    const { items, ...totals } = body;
    expect(items).toHaveLength(7);
    expect(totals).toEqual({
      nextCursor: null,
      findings: 7,
      dangerous: 5,
      dangerousNotTold: 4,
      cars: 5,
    });
  });

  it('given statuses, packages, bodies and days, lists and counts what fits them all', async () => {
    expect(await names('?status=gone&status=done')).toEqual([
      'closed floor/left/1',
      'closed floor/right/1',
    ]);
    expect(await names('?status=booked')).toEqual(['new floor/left/1']);
    expect(await names('?package=cavity')).toEqual(['holed floor/left/1']);
    expect(await names('?bodyType=van')).toEqual([]);
    expect(await names('?to=2026-01-27')).toEqual(['old floor/left/1']);
    const { body } = await list('?from=2026-01-28&limit=1');
    expect(body).toMatchObject({ findings: 6, dangerous: 4, dangerousNotTold: 3, cars: 4 });
    expect((await list('?bodyType=van')).body).toMatchObject({ findings: 0, cars: 0 });
  });

  it('given pages, walks every finding once in the same order', async () => {
    for (const limit of [1, 2, 3, 7]) {
      const walked: string[] = [];
      let cursor: string | null = '';
      while (cursor !== null) {
        const from: string = cursor === '' ? '' : `&cursor=${cursor}`;
        const { body } = await list(`?limit=${limit}${from}`);
        expect(body.findings).toBe(7);
        walked.push(...namesOf(body.items));
        cursor = body.nextCursor;
      }
      expect(walked).toEqual(OPEN);
    }
  });

  it('given a scope, lists within it; a code outside matches nothing (rule 22)', async () => {
    const seen = async (query: string, token: string) =>
      new Set((await list(query, token)).body.items.map((one: { branch: string }) => one.branch));
    expect(await seen('', network.manager)).toEqual(new Set(['AAA']));
    expect(await seen('', network.lead)).toEqual(new Set(['AAA', 'BBB']));
    expect(await seen('?region=HILLS', network.office)).toEqual(new Set(['CCC']));
    expect(await names('?branch=CCC', network.lead)).toEqual([]);
    expect((await list('?branch=CCC', network.lead)).body).toMatchObject({ findings: 0, cars: 0 });
    expect(await names('?region=COAST&branch=BBB', network.lead)).toEqual(['old floor/left/1']);
  });

  it.each([
    ['?cursor=AAAA', '/query/cursor'],
    ['?cursor=', '/query/cursor'],
    ['?limit=0', '/query/limit'],
    ['?limit=201', '/query/limit'],
    ['?status=closed', '/query/status'],
    ['?from=2026-02-01&to=2026-01-01', '/query/from'],
    ['?package=none', '/query/package'],
    ['?sort=danger', '/query/sort'],
  ])('given %s, refuses it there', async (query, path) => {
    const { status, body } = await list(query);
    expect(status).toBe(422);
    expect(body.problems.map((one: { path: string }) => one.path)).toContain(path);
  });

  it('given a recorder or a key, is not theirs', async () => {
    expect((await list('', network.recorder)).status).toBe(403);
    expect((await list('', network.keys['AAA'])).status).toBe(403);
  });
});

describe('GET /api/exports/come-back.csv', () => {
  const rowsOf = async (query = '', token = network.office) => {
    const answer = await app.call('get', `/api/exports/come-back.csv${query}`, { token });
    expect(answer.status).toBe(200);
    return parse<Record<string, string>>(answer.text, { columns: true, record_delimiter: '\r\n' });
  };

  it.each(['', '?status=gone&status=booked', '?branch=AAA&from=2026-01-28'])(
    'given %j, has the rows of the screen, in its order',
    async (query) => {
      const rows = await rowsOf(query);
      const { items } = (await list(query)).body as { items: Record<string, unknown>[] };
      expect(rows.length).toBeGreaterThan(0);
      expect(rows).toHaveLength(items.length);
      rows.forEach((row, n) => {
        const { vehicle, ...item } = items[n] as { vehicle: Record<string, unknown> };
        for (const [field, value] of Object.entries(item)) {
          // A null or empty value is an empty cell, and what a spreadsheet would run has an apostrophe (rule 62).
          expect(row[field]?.replace(/^'/, '')).toBe(
            value === null ? '' : String(value as boolean | string),
          );
        }
        for (const [field, value] of Object.entries(vehicle)) {
          expect(row[`vehicle.${field}`]).toBe(value);
        }
      });
    },
  );

  it('given text that a spreadsheet would run, defuses it; keeps to the scope; is in the trail', async () => {
    const [booked] = await rowsOf('?status=booked');
    expect(booked?.['note']).toBe("'-x");
    const own = await rowsOf('', network.manager);
    expect(new Set(own.map((row) => row['branch']))).toEqual(new Set(['AAA']));
    expect(own.map((row) => row['jobRef'])).toContain("'=rest");
    const trail = app.kit.store.unscoped.all<{ subject: string; detail: string }>(
      sql('audit_events').where({ action: 'export.come-back' }).orderBy('id', 'desc'),
    );
    expect(trail[0]?.subject).toBe('/exports/come-back.csv');
    expect(trail[0]?.detail).toContain('"branches":["AAA"]');
  });

  it('given a recorder, is not theirs', async () => {
    const token = network.recorder;
    expect((await app.call('get', '/api/exports/come-back.csv', { token })).status).toBe(403);
  });
});
