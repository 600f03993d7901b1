import { TestApp, type Answer } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
});
afterAll(() => app.stop());

let next = 0;
const fresh = (): string => `send-${(next += 1)}`;
const put = (ref: string, body: unknown, token = network.keys['AAA']): Promise<Answer> =>
  app.call('put', `/api/branches/AAA/jobs/${encodeURIComponent(ref)}`, { token, body });
const get = (ref: string, token = network.manager): Promise<Answer> =>
  app.call('get', `/api/branches/AAA/jobs/${encodeURIComponent(ref)}`, { token });
const without = (job: Record<string, unknown>, ...keys: string[]): Record<string, unknown> =>
  Object.fromEntries(Object.entries(job).filter(([key]) => !keys.includes(key)));

describe('PUT of a job', () => {
  it('given a new reference, creates it: 201, revision 1', async () => {
    const ref = fresh();
    const answer = await put(ref, validJob());
    expect([answer.status, answer.body]).toEqual([
      201,
      { jobRef: ref, revision: 1, status: 'created' },
    ]);
  });

  it('given the same content again, leaves it unchanged: 200', async () => {
    const ref = fresh();
    await put(ref, validJob());
    const answer = await put(ref, validJob());
    expect([answer.status, answer.body]).toEqual([
      200,
      { jobRef: ref, revision: 1, status: 'unchanged' },
    ]);
  });

  it('given a correction, makes revision after revision: 200', async () => {
    const ref = fresh();
    await put(ref, validJob());
    for (const revision of [2, 3]) {
      const answer = await put(ref, validJob({ notes: `n${revision}` }));
      expect([answer.status, answer.body]).toEqual([
        200,
        { jobRef: ref, revision, status: 'replaced' },
      ]);
    }
    // Back to the first content is a correction too: numbers never restart.
    expect((await put(ref, validJob())).body).toMatchObject({ revision: 4, status: 'replaced' });
  });

  it('given only what is required, takes it as unbilled and without estimate', async () => {
    const ref = fresh();
    const { vehicle } = validJob() as { vehicle: Record<string, unknown> };
    const body = {
      vehicle: without(vehicle, 'key', 'odometerKm'),
      package: 'full',
      completedOn: '2026-01-28',
      actual: { stages: {} },
    };
    expect((await put(ref, body)).status).toBe(201);
    const sheet = (await get(ref)).body;
    expect(sheet).toMatchObject({
      findings: [],
      products: [],
      consumables: [],
      boughtInCents: 0,
      notes: '',
      actual: {
        stages: { strip: 0, clean: 0, dry: 0, repair: 0, mask: 0, apply: 0, refit: 0 },
      },
      money: { revenueCents: null, marginCents: null, marginShare: null, bridge: null },
    });
    expect(sheet).not.toHaveProperty('estimate');
    expect(sheet).not.toHaveProperty('invoice');
  });
});

describe('PUT of a job that means the same (rule 25)', () => {
  const same = async (first: unknown, second: unknown): Promise<unknown> => {
    const ref = fresh();
    expect((await put(ref, first)).status).toBe(201);
    return (await put(ref, second)).body.status;
  };

  it('given defaults left out instead of written, is unchanged', async () => {
    const bare = without(validJob(), 'boughtInCents', 'notes');
    expect(await same(validJob(), bare)).toBe('unchanged');
    expect(
      await same(validJob({ findings: [], products: [] }), {
        ...without(bare, 'findings', 'products'),
        agreedExtras: [],
      }),
    ).toBe('unchanged');
  });

  it('given keys in another order, is unchanged', async () => {
    const turned = Object.fromEntries(Object.entries(validJob()).reverse());
    expect(await same(validJob(), turned)).toBe('unchanged');
  });

  it('given text composed in another way, is unchanged', async () => {
    expect(await same(validJob({ notes: 'é' }), validJob({ notes: 'e\u0301' }))).toBe('unchanged');
  });

  it('given the references it was given by default, is unchanged (rule 71)', async () => {
    const { findings } = validJob() as { findings: object[] };
    const named = findings.map((finding) => ({ ...finding, ref: 'sill_inner/left/1' }));
    expect(await same(validJob(), validJob({ findings: named }))).toBe('unchanged');
  });

  it('given white space and number forms of JSON, is unchanged', async () => {
    const text = JSON.stringify(validJob()).replace('"ml":4200', '"ml" : 4.2e3 ');
    expect(await same(validJob(), text)).toBe('unchanged');
  });

  it('given no invoice where one is stored, keeps it; given null, removes it (rule 73)', async () => {
    const ref = fresh();
    await put(ref, validJob());
    expect((await put(ref, without(validJob(), 'invoice'))).body.status).toBe('unchanged');
    expect((await get(ref)).body.invoice).toMatchObject({ totalCents: 87_000 });
    expect((await put(ref, validJob({ invoice: null }))).body.status).toBe('replaced');
    expect((await get(ref)).body).not.toHaveProperty('invoice');
    expect((await put(ref, without(validJob(), 'invoice'))).body.status).toBe('unchanged');
  });

  it.each([
    ['vehicle', { bodyType: 'suv' }],
    ['vehicle', { odometerKm: 0 }],
    ['estimate', { priceCents: 0 }],
    ['workshop', { temperatureC: -3.5 }],
    ['checks', { driedOut: 'no' }],
    ['invoice', { number: '0418' }],
  ])('given another %s (%j), is another revision', async (field, change) => {
    const job = validJob();
    const changed = { ...job, [field]: { ...(job[field] as object), ...change } };
    expect(await same(job, changed)).toBe('replaced');
  });
});

describe('PUT of equal jobs at once (rule 68)', () => {
  it('given twelve of them, creates one row, leaves the rest unchanged and never fails', async () => {
    const ref = fresh();
    const answers = await Promise.all(Array.from({ length: 12 }, () => put(ref, validJob())));
    const statuses = answers.map(({ status }) => status).sort();
    expect(statuses).toEqual([...Array(11).fill(200), 201]);
    expect(answers.filter(({ body }) => body.status === 'unchanged')).toHaveLength(11);
    expect((await get(ref)).body.revisions).toHaveLength(1);
  });

  it('given different ones, gives every revision a number of its own', async () => {
    const ref = fresh();
    const answers = await Promise.all(
      Array.from({ length: 8 }, (_, n) => put(ref, validJob({ notes: `v${n}` }))),
    );
    expect(answers.map(({ body }) => body.revision).sort()).toEqual([1, 2, 3, 4, 5, 6, 7, 8]);
    const { revisions } = (await get(ref)).body as { revisions: { revision: number }[] };
    expect(revisions.map(({ revision }) => revision)).toEqual([1, 2, 3, 4, 5, 6, 7, 8]);
  });
});

describe('A job reference (rule 55)', () => {
  it.each([
    'a/b/c',
    'a b',
    'ÅÉ/ß-車',
    '100% #1?x=y&z',
    '%2F',
    'a\\b',
    "Robert'); drop table jobs;--",
    '🚗'.repeat(64),
    '__proto__',
    'constructor',
    'batch2',
    '\u200b\u200d',
  ])('given %j percent-encoded, is one job and comes back as sent', async (ref) => {
    const answer = await put(ref, validJob());
    expect([answer.status, answer.body.jobRef]).toEqual([201, ref]);
    expect((await put(ref, validJob())).body.status).toBe('unchanged');
    expect((await get(ref)).body).toMatchObject({ jobRef: ref, branch: 'AAA' });
  });

  it('given another composition, is the same job; given another case, another one', async () => {
    expect((await put('caf\u00e9', validJob())).status).toBe(201);
    expect((await put('cafe\u0301', validJob())).body).toMatchObject({
      jobRef: 'caf\u00e9',
      status: 'unchanged',
    });
    expect((await put('CAF\u00c9', validJob())).status).toBe(201);
  });

  it.each([' a', 'a ', '\u00a0a', 'a\tb', 'a\nb', 'a\u0000b', 'a\u0085', 'x'.repeat(65), ' '])(
    'given %j, is refused and stores nothing',
    async (ref) => {
      const answer = await put(ref, validJob());
      expect([answer.status, answer.body.problems?.[0]?.path]).toEqual([422, '/jobRef']);
    },
  );

  it.each(['%E0%A4%A', '%', '%ZZ', '%ED%A0%80', '%FF'])(
    'given %s, which is no percent-encoding of text, is refused as unreadable',
    async (ref) => {
      const path = `/api/branches/AAA/jobs/${ref}`;
      const answer = await app.call('put', path, { token: network.keys['AAA'], body: validJob() });
      expect(answer.status).toBe(400);
      expect(answer.headers.get('content-type')).toContain('application/problem+json');
    },
  );

  it('given the same reference at another branch, is another job', async () => {
    const ref = fresh();
    await put(ref, validJob());
    const there = await app.call('put', `/api/branches/BBB/jobs/${ref}`, {
      token: network.keys['BBB'],
      body: validJob(),
    });
    expect(there.status).toBe(201);
  });
});
