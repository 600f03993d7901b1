import { parse } from 'csv-parse/sync';
import { sql } from '#db/database';
import { verifyAudit } from '#db/queries/audit';
import { TestApp } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start({ now: '2026-02-02T06:30:00Z' });
  network = await makeSmallNetwork(app);
  const vehicle = validJob()['vehicle'] as object;
  for (const [branch, ref, over] of [
    ['AAA', '=1+1', { vehicle: { ...vehicle, make: '-Vel, "der"', key: undefined } }],
    ['AAA', 'cheap', { package: 'cavity', invoice: { totalCents: 100 } }],
    ['AAA', 'open', { invoice: null, estimate: undefined }],
    ['BBB', 'b', {}],
  ] as const) {
    const path = `/api/branches/${branch}/jobs/${encodeURIComponent(ref)}`;
    const answer = await app.call('put', path, {
      token: network.keys[branch],
      body: validJob(over),
    });
    expect(answer.status).toBe(201);
  }
});
afterAll(() => app.stop());

const get = (path: string, token = network.manager) => app.call('get', path, { token });
/** Rows as objects of text, with CRLF required between them. */
const rowsOf = (text: string) =>
  parse<Record<string, string>>(text, { columns: true, record_delimiter: '\r\n' });

/** A JSON row as CSV tells it: fields named with dots, null as nothing, text that could run made harmless. */
function told(row: object, prefix = ''): Record<string, string> {
  const cells: Record<string, string> = {};
  for (const [field, value] of Object.entries(row) as [string, unknown][]) {
    if (typeof value === 'object' && value !== null) {
      Object.assign(cells, told(value, `${prefix}${field}.`));
    } else if (value !== null) {
      const runs = typeof value === 'string' && /^[=+\-@\t\r]/.test(value);
      cells[prefix + field] = `${runs ? "'" : ''}${value as string}`;
    }
  }
  return cells;
}
const filled = (rows: Record<string, string>[]) =>
  rows.map((row) => Object.fromEntries(Object.entries(row).filter(([, cell]) => cell !== '')));

describe('GET /api/exports/:name.csv', () => {
  it.each([
    ['jobs', '?sort=margin', '/api/jobs?sort=margin', 'items'],
    ['jobs', '?unbilled=false&q=vel', '/api/jobs?unbilled=false&q=vel', 'items'],
    ['margin', '?from=2026-01-19', '/api/analytics/margin?from=2026-01-19', 'weeks'],
    ['overrun', '?by=package', '/api/analytics/overrun?by=package', 'groups'],
    ['overrun', '', '/api/analytics/overrun', 'groups'],
  ])('given %s%s, has the rows of the screen', async (name, query, screen, list) => {
    const { status, text, headers } = await get(`/api/exports/${name}.csv${query}`);
    expect(status).toBe(200);
    expect(headers.get('content-type')).toMatch(/^text\/csv; charset=utf-8/);
    expect(headers.get('content-disposition')).toMatch(/^attachment; filename="[\w-]+\.csv"$/);
    expect(headers.get('cache-control')).toBe('no-store');
    const rows = (await get(screen)).body[list] as object[];
    expect(rows.length).toBeGreaterThan(1);
    expect(filled(rowsOf(text))).toEqual(rows.map((row) => told(row)));
  });

  it('given cells that a spreadsheet would run, defuses text and leaves numbers (rule 62)', async () => {
    const { text } = await get('/api/exports/jobs.csv');
    const cell = (row: Record<string, string> | undefined, name: string) => row?.[name];
    const rows = rowsOf(text);
    const row = rows.find((one) => one['jobRef'] === "'=1+1");
    expect(cell(row, 'vehicle.make')).toBe(`'-Vel, "der"`);
    expect(cell(row, 'vehicle.key')).toBe('');
    const cheap = rows.find((one) => one['jobRef'] === 'cheap');
    expect(cell(cheap, 'marginCents')).toBe(String(100 - 49_410 - 5));
    expect(text.startsWith('branch,jobRef,')).toBe(true);
  });

  it('given no job that fits, still has its header', async () => {
    const { text } = await get('/api/exports/jobs.csv?from=2020-01-01&to=2020-01-02');
    expect(text.split('\r\n')).toHaveLength(2);
  });

  it('given a scope, exports its rows only', async () => {
    const refs = async (token: string) =>
      rowsOf((await get('/api/exports/jobs.csv', token)).text).map((row) => row['branch']);
    expect(new Set(await refs(network.manager))).toEqual(new Set(['AAA']));
    expect(new Set(await refs(network.lead))).toEqual(new Set(['AAA', 'BBB']));
  });

  it('given a mistake in the query, is refused as the screen is and leaves no trace in the trail', async () => {
    const before = exportsTold().length;
    const refused = await get('/api/exports/margin.csv?from=2026-02-01&to=2026-01-01');
    expect(refused.status).toBe(422);
    expect(refused.headers.get('content-type')).toContain('application/problem+json');
    expect((await get('/api/exports/jobs.csv?limit=5')).status).toBe(422);
    expect((await get('/api/exports/none.csv')).status).toBe(404);
    expect((await get('/api/exports/jobs.csv', network.recorder)).status).toBe(403);
    expect(exportsTold()).toHaveLength(before);
  });

  it('given an export, the trail says who took which rows', async () => {
    await get('/api/exports/overrun.csv?by=month&branch=BBB&branch=AAA', network.lead);
    const last = exportsTold().at(-1);
    expect(last).toMatchObject({
      actor: 'lead@network.example',
      action: 'export.overrun',
      subject: '/exports/overrun.csv',
    });
    expect(JSON.parse(last?.detail ?? '')).toEqual({
      query: { by: 'month', branch: ['BBB', 'AAA'] },
      branches: ['AAA', 'BBB'],
    });
    expect(verifyAudit(app.kit.store.unscoped).brokenAt).toBeNull();
  });
});

function exportsTold(): { actor: string; action: string; subject: string; detail: string }[] {
  return app.kit.store.unscoped.all(
    sql('audit_events').whereLike('action', 'export.%').orderBy('id'),
  );
}
