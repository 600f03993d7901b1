import { createHash } from 'node:crypto';
import { sql } from '#db/database';
import { TestApp, type Answer } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
// Each answer is made and printed on a thread that takes seconds to start from source.
jest.setTimeout(120_000);
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
  for (let index = 0; index < 12; index += 1) {
    const completedOn = `${2023 + (index % 3)}-0${1 + (index % 6)}-15`;
    await send(index % 2 === 0 ? 'AAA' : 'CCC', `j${index}`, jobOf(completedOn));
  }
  await claim('AAA', 'c0', 'j0', '2024-03-01', '2024-05-02', 31_250);
  await claim('CCC', 'c1', 'j1', '2025-03-01', '2025-05-02', 12_750);
}, 60_000);
afterAll(() => app.stop());

const jobOf = (completedOn: string): Record<string, unknown> =>
  validJob({
    bookedOn: completedOn,
    startedOn: completedOn,
    completedOn,
    invoice: { number: '1', issuedOn: completedOn, totalCents: 87_000 },
  });
async function send(branch: string, ref: string, body: unknown): Promise<Answer> {
  const answer = await app.call('put', `/api/branches/${branch}/jobs/${ref}`, {
    token: network.office,
    body,
  });
  if (answer.status >= 300) throw new Error(answer.text);
  return answer;
}
async function claim(
  branch: string,
  ref: string,
  jobRef: string,
  madeOn: string,
  paidOn: string,
  costCents: number,
): Promise<void> {
  const answer = await app.call('put', `/api/branches/${branch}/claims/${ref}`, {
    token: network.office,
    body: {
      ...{ jobRef, madeOn, paidOn, costCents, zone: 'floor', cause: 'missed_area' },
      ...{ decision: 'accepted', decidedOn: madeOn },
    },
  });
  if (answer.status >= 300) throw new Error(answer.text);
}
const get = (path: string, token = network.office): Promise<Answer> =>
  app.call('get', path, { token });
const issue = (body: object = {}): Promise<Answer> =>
  app.call('post', '/api/warranty-reports', { token: network.office, body });
async function bytes(path: string): Promise<{ sha256: string; text: string; type: string }> {
  const response = await fetch(app.url + path, {
    headers: { authorization: `Bearer ${network.office}` },
  });
  const body = Buffer.from(await response.arrayBuffer());
  return {
    sha256: createHash('sha256').update(body).digest('hex'),
    text: body.toString('utf8'),
    type: response.headers.get('content-type') ?? '',
  };
}

describe('GET /api/warranty-report', () => {
  it('given a past day, is of the whole network from the first job, with its warranty-risk rows', async () => {
    const { status, body } = await get('/api/warranty-report?asOf=2025-12-31');
    expect(status).toBe(200);
    expect(body).toMatchObject({ network: 'Small', currency: 'EUR', asOf: '2025-12-31' });
    expect(body.answer).toMatchObject({ jobs: 12, covered: 12, period: { from: '2023-01-15' } });
    expect(body.branches).toHaveLength(8);
    const sum = body.rows.reduce(
      (all: number, row: { paidCents: number }) => all + row.paidCents,
      0,
    );
    expect(sum).toBe(44_000);
    const warranty = await get('/api/analytics/warranty?asOf=2025-12-31');
    expect(body.answer).toEqual(warranty.body);
  });

  it('given a day to come, answers 422 at the day', async () => {
    for (const path of ['/api/warranty-report', '/api/warranty-report/pdf']) {
      const answer = await get(`${path}?asOf=2026-02-03`);
      expect([answer.status, answer.body.problems[0].path]).toEqual([422, '/query/asOf']);
    }
    const issued = await issue({ asOf: '2026-02-03' });
    expect([issued.status, issued.body.problems[0].path]).toEqual([422, '/asOf']);
  });

  it('given anybody but head office, answers 403', async () => {
    for (const token of [network.lead, network.manager, network.recorder]) {
      for (const path of ['report', 'report/pdf', 'reports', 'reports/1', 'reports/1/csv']) {
        expect((await get(`/api/warranty-${path}`, token)).status).toBe(403);
      }
    }
  });

  it('given the same day and data, is the same PDF each time and in the trail each time', async () => {
    const path = '/api/warranty-report/pdf?asOf=2025-12-31';
    const [first, second] = [await bytes(path), await bytes(path)];
    expect(first.type).toBe('application/pdf');
    expect(first.text.startsWith('%PDF-')).toBe(true);
    expect(second.sha256).toBe(first.sha256);
    expect((await bytes('/api/warranty-report/pdf?asOf=2025-12-30')).sha256).not.toBe(first.sha256);
    const trail = await get('/api/audit?action=export.warranty-report');
    expect(trail.body.items.slice(0, 3)).toMatchObject([
      { subject: '/warranty-report/pdf', detail: { asOf: '2025-12-30' } },
      { subject: '/warranty-report/pdf', detail: { asOf: '2025-12-31' } },
      { subject: '/warranty-report/pdf', detail: { asOf: '2025-12-31' } },
    ]);
  });
});

describe('An issued warranty report', () => {
  it('is kept as it was, while what came later for its period stands beside it', async () => {
    const made = await issue({ asOf: '2025-12-31' });
    expect(made.status).toBe(201);
    const { id } = made.body as { id: number };
    expect(made.body).toMatchObject({
      asOf: '2025-12-31',
      by: 'office@network.example',
      covered: 12,
      claims: 2,
    });
    const path = `/api/warranty-reports/${id}`;
    const [pdf, csv] = [await bytes(`${path}/pdf`), await bytes(`${path}/csv`)];
    expect([pdf.sha256, csv.sha256]).toEqual([made.body.pdfSha256, made.body.csvSha256]);
    expect(csv.text).toBe((await bytes('/api/exports/warranty-risk.csv?asOf=2025-12-31')).text);
    expect(pdf.sha256).toBe((await bytes('/api/warranty-report/pdf?asOf=2025-12-31')).sha256);
    const before = await get(path);
    expect(before.body).toMatchObject({
      later: [],
      laterCount: 0,
      now: { covered: 12, claims: 2 },
    });
    expect(before.body.report).toEqual((await get('/api/warranty-report?asOf=2025-12-31')).body);

    await send('AAA', 'late', jobOf('2025-06-30'));
    await send('AAA', 'outside', jobOf('2026-01-20'));
    await send('CCC', 'j1', { ...jobOf('2024-02-15'), notes: 'corrected' });
    await send('CCC', 'j3', jobOf('2026-01-15'));
    await claim('AAA', 'c2', 'j0', '2025-11-03', '2025-12-01', 5_000);
    await claim('AAA', 'c3', 'j0', '2026-01-03', '2026-01-04', 5_000);
    await claim('CCC', 'c1', 'j1', '2025-03-01', '2025-05-02', 13_000);
    const voided = await app.call('delete', '/api/branches/AAA/jobs/j2', {
      token: network.manager,
    });
    expect(voided.status).toBe(204);
    const after = (await get(path)).body;
    expect(after.issued).toEqual(before.body.issued);
    expect(after.report).toEqual(before.body.report);
    const told = after.later.map((one: Record<string, unknown>) =>
      [one['what'], one['kind'], one['branch'], one['ref'], one['on'], one['costCents']].join(' '),
    );
    expect([...told].sort()).toEqual(
      [
        'corrected claim CCC c1 2025-03-01 13000',
        'corrected job CCC j1 2024-02-15 ',
        'corrected job CCC j3 2026-01-15 ',
        'new claim AAA c2 2025-11-03 5000',
        'new job AAA late 2025-06-30 ',
        'voided job AAA j2 2025-03-15 ',
      ].sort(),
    );
    expect(after.laterCount).toBe(6);
    expect(after.later[0]).toMatchObject({
      what: 'voided',
      jobRef: 'j2',
      by: 'manager@network.example',
    });
    expect(after.now).toMatchObject({ covered: 11, claims: 3 });
    expect((await bytes(`${path}/pdf`)).sha256).toBe(made.body.pdfSha256);
    expect((await bytes(`${path}/csv`)).sha256).toBe(made.body.csvSha256);
    expect((await issue({ asOf: '2025-12-31' })).body.pdfSha256).not.toBe(made.body.pdfSha256);
  }, 120_000);

  it('given a job brought back, tells that too', async () => {
    const { body } = await issue({ asOf: '2025-12-31' });
    const back = await app.call('post', '/api/branches/AAA/jobs/j2/restore', {
      token: network.manager,
    });
    expect(back.status).toBe(200);
    const { later } = (await get(`/api/warranty-reports/${body.id}`)).body;
    expect(later).toMatchObject([{ what: 'restored', kind: 'job', ref: 'j2' }]);
  });

  it('given a day by default, is of today, and each is listed, the newest first, page by page', async () => {
    const { body } = await issue();
    expect(body.asOf).toBe('2026-02-02');
    const first = await get('/api/warranty-reports?limit=2');
    expect(first.body.items[0]).toEqual(body);
    const next = await get(`/api/warranty-reports?limit=200&cursor=${first.body.nextCursor}`);
    const ids = [...first.body.items, ...next.body.items].map((one: { id: number }) => one.id);
    expect(ids).toEqual([...ids].sort((a, b) => b - a));
    expect([ids.length, next.body.nextCursor]).toEqual([body.id, null]);
    const wrong = await get('/api/warranty-reports?cursor=bm8');
    expect([wrong.status, wrong.body.problems[0].path]).toEqual([422, '/query/cursor']);
  });

  it('given a number of none, answers 404', async () => {
    for (const id of ['0', '999', '-1', '1e0', 'x', '1'.repeat(40)]) {
      for (const tail of ['', '/pdf', '/csv']) {
        expect((await get(`/api/warranty-reports/${id}${tail}`)).status).toBe(404);
      }
    }
  });

  it('given who issued and who fetched, has both in the trail', async () => {
    const { body } = await issue();
    await bytes(`/api/warranty-reports/${body.id}/csv`);
    const issued = await get('/api/audit?action=warranty-report.issue');
    expect(issued.body.items[0]).toMatchObject({
      actor: 'office@network.example',
      subject: `/warranty-reports/${body.id}`,
      detail: { asOf: '2026-02-02', pdfSha256: body.pdfSha256, csvSha256: body.csvSha256 },
    });
    const fetched = await get('/api/audit?action=export.warranty-report');
    expect(fetched.body.items[0]).toMatchObject({ subject: `/warranty-reports/${body.id}/csv` });
  });

  it('given any way to change it in the file, stays', () => {
    const { driver } = app.kit.store.writing;
    const before = app.kit.store.unscoped.all(sql('warranty_reports'));
    const columns = Object.keys(before[0] as object);
    for (const column of columns) {
      expect(() => driver.exec(`update warranty_reports set ${column} = ${column}`)).toThrow(
        'append-only',
      );
    }
    expect(() => driver.exec('delete from warranty_reports')).toThrow('append-only');
    const all = columns.join(', ');
    const replaced = `insert or replace into warranty_reports (${all}) select ${all} from warranty_reports where id = 1`;
    expect(() => driver.exec(replaced)).toThrow('append-only');
    expect(app.kit.store.unscoped.all(sql('warranty_reports'))).toEqual(before);
  });
});
