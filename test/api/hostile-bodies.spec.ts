import { TestApp, type Answer } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
  for (let n = 0; n < 5; n += 1) {
    const path = `/api/branches/AAA/jobs/kept-${n}`;
    await app.call('put', path, { token: network.manager, body: validJob() });
  }
});
afterAll(() => app.stop());

const put = (body: unknown, ref = 'hostile'): Promise<Answer> =>
  app.call('put', `/api/branches/AAA/jobs/${ref}`, { token: network.manager, body });
const text = (job: Record<string, unknown> = validJob()): string => JSON.stringify(job);
const get = (path: string, token = network.manager): Promise<Answer> =>
  app.call('get', path, { token });
/** A refusal is a problem document and nothing more. */
function expectRefused({ status, headers, body }: Answer, ...statuses: number[]): void {
  expect(statuses).toContain(status);
  expect(headers.get('content-type')).toContain('application/problem+json');
  expect(body).toMatchObject({ type: expect.any(String), title: expect.any(String), status });
}

describe('A body that means harm', () => {
  it.each([
    ['deep lists', `${'['.repeat(100_000)}${']'.repeat(100_000)}`],
    ['deep objects', `${'{"a":'.repeat(50_000)}1${'}'.repeat(50_000)}`],
    [
      'a deep value in a known field',
      text().replace('"notes":""', `"notes":${'['.repeat(50_000)}${']'.repeat(50_000)}`),
    ],
    [
      'deep findings',
      text().replace('"findings":[', `"findings":[${'['.repeat(9000)}${']'.repeat(9000)},`),
    ],
    ['an infinite number', text().replace('"ml":4200', '"ml":1e999')],
    ['a negative infinite number', text().replace('"temperatureC":14', '"temperatureC":-1e999')],
    ['a number past 2⁵³', text().replace('"ml":4200', '"ml":9007199254740993')],
    ['a number of 400 digits', text().replace('"ml":4200', `"ml":${'9'.repeat(400)}`)],
    ['a fraction too small to see', text().replace('"ml":4200', '"ml":4200.0000001')],
    [
      'a million digits of fraction',
      text().replace('"totalCents":87000', `"totalCents":1.${'1'.repeat(1_000_000)}`),
    ],
    ['a lone surrogate in a name', text().replace('"make":"Velder"', '"make":"\\ud800"')],
    ['a lone surrogate in a note', text().replace('"notes":""', '"notes":"\\udc00"')],
    ['a null character in a name', text().replace('"make":"Velder"', '"make":"a\\u0000b"')],
    ['a null character in a note', text().replace('"notes":""', '"notes":"a\\u0000b"')],
    [
      'a name of a million letters',
      text().replace('"make":"Velder"', `"make":"${'x'.repeat(1_000_000)}"`),
    ],
    [
      'a hundred thousand findings',
      text(validJob({ findings: Array.from({ length: 100_000 }, () => 1) })),
    ],
    ['a constructor to call', text().replace('{', '{"constructor":{"prototype":{"x":1}},')],
    ['an array like an object', '{"length":3,"0":{}}'],
  ])(
    'given %s, refuses it as input and serves on',
    async (_, body) => {
      expectRefused(await put(body), 422, 413, 400);
      expect((await get('/api/health')).status).toBe(200);
    },
    20_000,
  );

  it('given many unknown fields, names them without choking', async () => {
    const fields = Object.fromEntries(Array.from({ length: 20_000 }, (_, n) => [`x${n}`, n]));
    const answer = await put({ ...validJob(), ...fields });
    expectRefused(answer, 422);
    expect(answer.body.problems.length).toBeGreaterThan(0);
  });

  it('given a negative zero or an exponent for a whole number, takes the number it is', async () => {
    const body = text().replace('"ml":4200', '"ml":-0').replace('"strip":110', '"strip":1.1e2');
    expect((await put(body, 'zero')).status).toBe(201);
    const sheet = (await get('/api/branches/AAA/jobs/zero')).body;
    expect([Object.is(sheet.products[0].ml, 0), sheet.actual.stages.strip]).toEqual([true, 110]);
  });

  it('given a field twice, takes the last as JSON does, and is the same job as with one', async () => {
    const twice = text().replace('"notes":""', '"notes":"first","notes":"last"');
    expect((await put(twice, 'twice')).status).toBe(201);
    expect((await put(validJob({ notes: 'last' }), 'twice')).body.status).toBe('unchanged');
  });

  it('given the largest of everything, keeps figures exact', async () => {
    const most = 1_000_000_000;
    const stages = Object.fromEntries(
      ['strip', 'clean', 'dry', 'repair', 'mask', 'apply', 'refit'].map((one) => [one, 100_000]),
    );
    const job = validJob({
      estimate: { priceCents: most, stages },
      actual: { stages },
      products: Array.from({ length: 100 }, () => ({ product: 'CW1', ml: 1_000_000 })),
      consumables: Array.from({ length: 100 }, () => ({
        kind: 'other',
        quantity: 100_000,
        unitCostCents: 10_000,
      })),
      boughtInCents: most,
      invoice: { totalCents: most },
      findings: [],
    });
    expect((await put(job, 'most')).status).toBe(201);
    const { money } = (await get('/api/branches/AAA/jobs/most')).body;
    // 7 × 100,000 min × 60 = 42,000,000 · 100 × 1,000 l × 12.00 = 120,000,000 · 100 × 10⁹
    expect(money.costCents).toBe(42_000_000 + 120_000_000 + 100 * most + most);
    expect(money.marginCents).toBe(most - money.costCents - most / 20);
    expect((await get('/api/analytics/margin')).status).toBe(200);
    await app.call('delete', '/api/branches/AAA/jobs/most', { token: network.manager });
  });

  it('given text that reads like SQL or markup, keeps it as text', async () => {
    const notes = `'; drop table jobs; -- "<script>alert(1)</script> \${7*7} %s %00`;
    await put(
      validJob({ notes, vehicle: { ...(validJob()['vehicle'] as object), make: `O'x"--` } }),
      'sql',
    );
    expect((await get('/api/branches/AAA/jobs/sql')).body).toMatchObject({
      notes,
      vehicle: { make: `O'x"--` },
    });
    for (const q of [`O'x"--`, '%', '_', "' or 1=1 --", '\\']) {
      const found = await get(`/api/jobs?q=${encodeURIComponent(q)}`);
      expect([q, found.status, found.body.jobs]).toEqual([q, 200, q.startsWith('O') ? 1 : 0]);
    }
  });
});
