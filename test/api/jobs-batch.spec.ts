import { gzipSync } from 'node:zlib';
import { TestApp, type Answer } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
});
afterAll(() => app.stop());

const send = (body: unknown, token = network.keys['AAA']): Promise<Answer> =>
  app.call('post', '/api/branches/AAA/jobs/batch', { token, body });
const item = (jobRef: unknown, overrides: Record<string, unknown> = {}): unknown => ({
  jobRef,
  ...validJob(overrides),
});
const jobCount = async (): Promise<number> => {
  const list = await app.call('get', '/api/jobs?limit=1', { token: network.office });
  return (list.body as { jobs: number }).jobs;
};

describe('POST of a batch', () => {
  it('given good and bad jobs, answers in their order, keeps the good and names the bad (rule 58)', async () => {
    await send({ jobs: [item('m-1'), item('m-2')] });
    const { status, body } = await send({
      jobs: [
        item('m-1'),
        item('m-3', { package: 'gold' }),
        item('m-2', { notes: 'corrected' }),
        item('m-4'),
        'no object',
        item(' m-5'),
        item(undefined),
        item(7, { colour: 'red' }),
        null,
        [item('m-6')],
      ],
    });
    expect(status).toBe(200);
    expect(body.counts).toEqual({ created: 1, replaced: 1, unchanged: 1, rejected: 7 });
    expect(
      body.results.map((one: { problems?: { path: string }[] }) => ({
        ...one,
        ...(one.problems && { problems: one.problems.map(({ path }) => path) }),
      })),
    ).toEqual([
      { jobRef: 'm-1', status: 'unchanged', revision: 1 },
      { jobRef: 'm-3', status: 'rejected', problems: ['/package'] },
      { jobRef: 'm-2', status: 'replaced', revision: 2 },
      { jobRef: 'm-4', status: 'created', revision: 1 },
      { jobRef: null, status: 'rejected', problems: [''] },
      { jobRef: ' m-5', status: 'rejected', problems: ['/jobRef'] },
      { jobRef: null, status: 'rejected', problems: ['/jobRef'] },
      { jobRef: null, status: 'rejected', problems: ['/jobRef', '/colour'] },
      { jobRef: null, status: 'rejected', problems: [''] },
      { jobRef: null, status: 'rejected', problems: [''] },
    ]);
    const sheet = await app.call('get', '/api/branches/AAA/jobs/m-2', { token: network.manager });
    expect(sheet.body.notes).toBe('corrected');
  });

  it('given one reference twice, makes two revisions in order; thrice equal, one', async () => {
    const { body } = await send({
      jobs: [
        item('d', { notes: 'first' }),
        item('d', { notes: 'second' }),
        item('d', { notes: 'second' }),
      ],
    });
    expect(body.results).toEqual([
      { jobRef: 'd', status: 'created', revision: 1 },
      { jobRef: 'd', status: 'replaced', revision: 2 },
      { jobRef: 'd', status: 'unchanged', revision: 2 },
    ]);
  });

  it('given the largest batch, keeps all of it', async () => {
    const jobs = Array.from({ length: 1000 }, (_, n) => item(`big-${n}`));
    const before = await jobCount();
    const { status, body } = await send({ jobs });
    expect([status, body.counts.created]).toEqual([200, 1000]);
    expect(body.results.map(({ jobRef }: { jobRef: string }) => jobRef)).toEqual(
      jobs.map((one) => (one as { jobRef: string }).jobRef),
    );
    expect(await jobCount()).toBe(before + 1000);
  });

  it('given one batch twice at once, creates each job once', async () => {
    const jobs = Array.from({ length: 300 }, (_, n) => item(`twice-${n}`));
    const answers = await Promise.all([send({ jobs }), send({ jobs })]);
    const created = answers.map(({ body }) => body.counts.created as number);
    const unchanged = answers.map(({ body }) => body.counts.unchanged as number);
    expect(created[0]! + created[1]!).toBe(300);
    expect(unchanged[0]! + unchanged[1]!).toBe(300);
  });

  it('given a refusal that needs the stored job, gives it with the others of that job', async () => {
    await send({ jobs: [item('claimed')] });
    const claim = {
      jobRef: 'claimed',
      madeOn: '2026-01-29',
      zone: 'floor',
      cause: 'damage',
      decision: 'open',
      labourMinutes: 0,
      productMl: 0,
      costCents: 0,
    };
    await app.call('put', '/api/branches/AAA/claims/on-it', {
      token: network.manager,
      body: claim,
    });
    const { body } = await send({
      jobs: [item('claimed', { completedOn: '2026-01-30', colour: 'red' }), item('after')],
    });
    const [first, second] = body.results;
    expect(first.problems.map(({ path }: { path: string }) => path).sort()).toEqual([
      '/colour',
      '/completedOn',
    ]);
    expect(second.status).toBe('created');
  });
});

describe('POST of a batch that is refused as a whole (rule 58)', () => {
  it.each<[string, () => unknown, string]>([
    ['no job', () => ({ jobs: [] }), '/jobs'],
    [
      '1001 jobs',
      () => ({ jobs: Array.from({ length: 1001 }, (_, n) => item(`x-${n}`)) }),
      '/jobs',
    ],
    ['an object for a list', () => ({ jobs: { 0: item('x') } }), '/jobs'],
    ['no list', () => ({}), '/jobs'],
    ['a bare list', () => [item('x')], ''],
    ['an unknown field beside the list', () => ({ jobs: [item('x')], dryRun: true }), '/dryRun'],
  ])('given %s, answers 422 and keeps nothing', async (_, body, pointer) => {
    const before = await jobCount();
    const answer = await send(body());
    expect([answer.status, answer.body.problems[0].path]).toEqual([422, pointer]);
    expect(await jobCount()).toBe(before);
  });

  it('given 17 MB, takes it; given 40 MB, answers 413', async () => {
    const padded = (megabytes: number): string =>
      `{"jobs":[${JSON.stringify(item('padded'))}${' '.repeat(megabytes * 1024 * 1024)}]}`;
    expect((await send(padded(17))).status).toBe(200);
    const answer = await send(padded(40));
    expect(answer.status).toBe(413);
    expect(answer.headers.get('content-type')).toContain('application/problem+json');
    expect(answer.body.status).toBe(413);
  });

  it('given a single job of 3 MB, answers 413', async () => {
    const body = `${JSON.stringify(validJob())}${' '.repeat(3 * 1024 * 1024)}`;
    const path = '/api/branches/AAA/jobs/large';
    const answer = await app.call('put', path, { token: network.keys['AAA'], body });
    expect([answer.status, answer.body.status]).toEqual([413, 413]);
  });

  it('given a compressed body, reads it; one that grows past the limit answers 413, an unknown coding 415', async () => {
    const post = async (body: Uint8Array<ArrayBuffer>, coding: string): Promise<number> => {
      const { status } = await fetch(`${app.url}/api/branches/AAA/jobs/batch`, {
        method: 'POST',
        headers: {
          authorization: `Bearer ${network.keys['AAA']}`,
          'content-type': 'application/json',
          'content-encoding': coding,
        },
        body,
      });
      return status;
    };
    const zipped = (text: string): Uint8Array<ArrayBuffer> => new Uint8Array(gzipSync(text));
    const jobs = JSON.stringify({ jobs: [item('zipped')] });
    expect(await post(zipped(jobs), 'gzip')).toBe(200);
    expect(await post(zipped(jobs + ' '.repeat(64 * 1024 * 1024)), 'gzip')).toBe(413);
    expect(await post(zipped(jobs).slice(0, 40), 'gzip')).toBe(400);
    expect(await post(zipped(jobs), 'secret')).toBe(415);
  });

  it.each([
    ['{"jobs":[', 400],
    ['{"jobs":[]} x', 400],
    ["{'jobs':[]}", 400],
    ['', 400],
    ['\u0000', 400],
  ])('given %j, which is no JSON, answers %d', async (text, status) => {
    const answer = await app.call('post', '/api/branches/AAA/jobs/batch', {
      token: network.keys['AAA'],
      body: text,
    });
    expect([answer.status, answer.body.status]).toEqual([status, status]);
    expect(answer.headers.get('content-type')).toContain('application/problem+json');
  });

  it.each(['text/csv', 'application/xml', 'multipart/form-data; boundary=x', 'text/json'])(
    'given the content type %s, answers 415',
    async (type) => {
      const answer = await app.call('post', '/api/branches/AAA/jobs/batch', {
        token: network.keys['AAA'],
        body: '{"jobs":[]}',
        headers: { 'content-type': type },
      });
      expect([answer.status, answer.body.status]).toEqual([415, 415]);
    },
  );

  it('given JSON with a charset or a byte order mark, reads it', async () => {
    for (const [type, text] of [
      ['application/json; charset=utf-8', JSON.stringify({ jobs: [item('charset')] })],
      ['application/json', `\ufeff${JSON.stringify({ jobs: [item('bom')] })}`],
    ] as const) {
      const answer = await app.call('post', '/api/branches/AAA/jobs/batch', {
        token: network.keys['AAA'],
        body: text,
        headers: { 'content-type': type },
      });
      expect(answer.body.counts.created).toBe(1);
    }
  });
});

describe('The order of checks (rule 82)', () => {
  const path = '/api/branches/AAA/jobs/batch';
  const broken = { body: '{"jobs":', headers: { 'content-type': 'text/plain' } };

  it.each<[string, number, string, () => string | undefined]>([
    ['no token', 401, path, () => undefined],
    ['a token that is none', 401, '/api/branches/ZZZ/jobs/batch', () => 'nonsense'],
    ['a role that never sends jobs', 403, '/api/branches/ZZZ/jobs/batch', () => network.lead],
    ['a branch out of scope', 404, '/api/branches/BBB/jobs/batch', () => network.manager],
    ['a branch that does not exist', 404, '/api/branches/ZZZ/jobs/batch', () => network.office],
    ['a push key of another branch', 404, path, () => network.keys['BBB']],
    ['everything right but the type', 415, path, () => network.manager],
  ])('given %s and a broken body of a wrong type, answers %d', async (_, status, at, token) => {
    const answer = await app.call('post', at, { ...broken, token: token() });
    expect([answer.status, answer.body.status]).toEqual([status, status]);
  });

  it.each([
    ['put', '/api/branches/ZZZ/rates/2026-01-01', 'office'],
    ['put', '/api/products/ZZ9/costs/2026-01-01', 'office'],
    ['put', '/api/packages/gold/norms/suv', 'office'],
    ['put', '/api/people/999', 'office'],
    ['put', '/api/branches/AAA/jobs/nobody/invoice', 'manager'],
  ] as const)(
    'given %s %s, which is not there, answers 404 whatever the body',
    async (method, at, who) => {
      for (const sent of [broken, { body: '{' }, { body: { nonsense: 1 } }]) {
        expect((await app.call(method, at, { ...sent, token: network[who] })).status).toBe(404);
      }
    },
  );

  it('given an answer out of scope, is the same as of what does not exist', async () => {
    const ask = (branch: string): Promise<Answer> =>
      app.call('get', `/api/branches/${branch}/jobs/x`, { token: network.manager });
    const [outside, nowhere, inside] = await Promise.all([ask('BBB'), ask('ZZZ'), ask('AAA')]);
    expect(outside.text).toBe(nowhere.text);
    expect(inside.text).toBe(nowhere.text);
    expect([outside.status, nowhere.status, inside.status]).toEqual([404, 404, 404]);
  });
});
