import { TestApp, type Answer } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
  for (const [branch, ref] of [
    ['AAA', 'job'],
    ['AAA', 'other/job'],
    ['BBB', 'theirs'],
  ]) {
    const path = `/api/branches/${branch}/jobs/${encodeURIComponent(ref!)}`;
    await app.call('put', path, { token: network.office, body: validJob() });
  }
});
afterAll(() => app.stop());

let next = 0;
const fresh = (): string => `claim-${(next += 1)}`;
const at = (ref: string): string => `/api/branches/AAA/claims/${encodeURIComponent(ref)}`;
const put = (ref: string, body: unknown, token = network.keys['AAA']): Promise<Answer> =>
  app.call('put', at(ref), { token, body });
const get = (ref: string, token = network.manager): Promise<Answer> =>
  app.call('get', at(ref), { token });
const batch = (body: unknown): Promise<Answer> =>
  app.call('post', '/api/branches/AAA/claims/batch', { token: network.keys['AAA'], body });
const paths = (problems: { path: string }[]): string[] => problems.map(({ path }) => path).sort();

const CLAIM = {
  jobRef: 'job',
  madeOn: '2026-01-29',
  zone: 'sill_outer',
  cause: 'thin_coverage',
  decision: 'accepted',
  decidedOn: '2026-01-30',
  labourMinutes: 60,
  productMl: 300,
  costCents: 4500,
  paidOn: '2026-02-01',
};

describe('PUT of a claim', () => {
  it('given a new one, the same again and a correction, answers as for jobs', async () => {
    const ref = fresh();
    const made = await put(ref, CLAIM);
    expect([made.status, made.body]).toEqual([
      201,
      { claimRef: ref, revision: 1, status: 'created', decision: 'accepted' },
    ]);
    const again = await put(ref, CLAIM);
    expect([again.status, again.body.status]).toEqual([200, 'unchanged']);
    const corrected = await put(ref, { ...CLAIM, productMl: 301 });
    expect([corrected.status, corrected.body]).toMatchObject([
      200,
      { revision: 2, status: 'replaced' },
    ]);
  });

  it('given defaults written out, another key order or composition, is unchanged', async () => {
    const ref = fresh();
    const bare = {
      jobRef: 'job',
      madeOn: '2026-01-29',
      zone: 'floor',
      cause: 'damage',
      decision: 'open',
    };
    await put(ref, { ...bare, note: 'é' });
    const written = { note: 'e\u0301', costCents: 0, productMl: 0, labourMinutes: 0, ...bare };
    expect((await put(ref, written)).body.status).toBe('unchanged');
  });

  it('given a side, any that a finding may name, keeps and gives it; given another word, names it', async () => {
    const ref = fresh();
    for (const side of ['left', 'centre']) {
      expect((await put(ref, { ...CLAIM, side })).status).toBeLessThan(300);
      expect((await get(ref)).body.side).toBe(side);
    }
    expect((await put(ref, { ...CLAIM, side: 'centre' })).body.status).toBe('unchanged');
    await put(ref, CLAIM);
    expect('side' in (await get(ref)).body).toBe(false);
    const wrong = await put(ref, { ...CLAIM, side: 'top' });
    expect([wrong.status, paths(wrong.body.problems)]).toEqual([422, ['/side']]);
  });

  it('given twelve equal ones at once, makes one', async () => {
    const ref = fresh();
    const answers = await Promise.all(Array.from({ length: 12 }, () => put(ref, CLAIM)));
    expect(answers.map(({ status }) => status).sort()).toEqual([...Array(11).fill(200), 201]);
  });

  it('given references with a slash, keeps the claim on that job and gives it back', async () => {
    const ref = `a/${fresh()} ß`;
    expect((await put(ref, { ...CLAIM, jobRef: 'other/job' })).status).toBe(201);
    expect((await get(ref)).body).toEqual({
      ...CLAIM,
      jobRef: 'other/job',
      branch: 'AAA',
      claimRef: ref,
      revision: 1,
    });
  });

  it('given another job of the branch, moves there; given a job of another branch, does not know it', async () => {
    const ref = fresh();
    await put(ref, CLAIM);
    expect((await put(ref, { ...CLAIM, jobRef: 'other/job' })).body.status).toBe('replaced');
    const away = await put(ref, { ...CLAIM, jobRef: 'theirs' });
    expect([away.status, paths(away.body.problems)]).toEqual([422, ['/jobRef']]);
    expect((await get(ref)).body.jobRef).toBe('other/job');
  });
});

describe('PUT of a claim that is refused', () => {
  it.each([
    ['jobRef', 'nobody', ['/jobRef']],
    ['jobRef', undefined, ['/jobRef']],
    ['madeOn', '2026-01-27', ['/madeOn']],
    ['madeOn', '2026-02-03', ['/decidedOn', '/madeOn', '/paidOn']],
    ['decidedOn', '2026-01-28', ['/decidedOn']],
    ['decidedOn', '2026-02-03', ['/decidedOn']],
    ['paidOn', '2026-01-28', ['/paidOn']],
    ['paidOn', '2026-02-03', ['/paidOn']],
    ['decision', 'open', ['/paidOn']],
    ['decision', 'maybe', ['/decision']],
    ['zone', 'roof', ['/zone']],
    ['cause', 'rain', ['/cause']],
    ['labourMinutes', -1, ['/labourMinutes']],
    ['productMl', 1.5, ['/productMl']],
    ['costCents', 1_000_000_001, ['/costCents']],
    ['colour', 'red', ['/colour']],
  ])('given %s = %j, names %j', async (field, value, expected) => {
    const ref = fresh();
    const answer = await put(ref, { ...CLAIM, [field]: value });
    expect([answer.status, paths(answer.body.problems)]).toEqual([422, expected]);
    expect((await get(ref)).status).toBe(404);
  });

  it('given everything wrong, names it all at once (rule 57)', async () => {
    const answer = await put(fresh(), {
      jobRef: 'nobody',
      madeOn: '2026-01-29',
      zone: 'roof',
      decision: 'open',
      decidedOn: '2026-01-01',
      paidOn: '2026-03-01',
      costCents: -1,
      x: 1,
    });
    expect(new Set(paths(answer.body.problems))).toEqual(
      new Set(['/jobRef', '/zone', '/cause', '/decidedOn', '/paidOn', '/costCents', '/x']),
    );
  });

  it('given a claim on the day of completion, takes it', async () => {
    expect((await put(fresh(), { ...CLAIM, madeOn: '2026-01-28' })).status).toBe(201);
  });
});

describe('POST of a batch of claims', () => {
  it('given good and bad ones, keeps the good and names the bad, in order', async () => {
    const refs = [fresh(), fresh()];
    await put(refs[0]!, CLAIM);
    const { status, body } = await batch({
      claims: [
        { claimRef: refs[0], ...CLAIM },
        { claimRef: refs[1], ...CLAIM, jobRef: 'nobody', zone: 'roof' },
        { claimRef: refs[1], ...CLAIM },
        { claimRef: refs[1], ...CLAIM, costCents: 1 },
        { ...CLAIM },
        7,
      ],
    });
    expect([status, body.counts]).toEqual([
      200,
      { created: 1, replaced: 1, unchanged: 1, rejected: 3 },
    ]);
    expect(body.results.map((one: { status: string }) => one.status)).toEqual([
      'unchanged',
      'rejected',
      'created',
      'replaced',
      'rejected',
      'rejected',
    ]);
    expect(paths(body.results[1].problems)).toEqual(['/jobRef', '/zone']);
    expect(paths(body.results[4].problems)).toEqual(['/claimRef']);
  });

  it('given none, too many or no list, is refused as a whole', async () => {
    const many = Array.from({ length: 1001 }, () => ({ claimRef: 'x', ...CLAIM }));
    for (const body of [{ claims: [] }, { claims: many }, { claims: {} }, [], {}]) {
      expect((await batch(body)).status).toBe(422);
    }
    expect((await get('x')).status).toBe(404);
  });
});

describe('GET of a claim', () => {
  it('given a recorder, leaves the cost out (rule 24); given a push key, is refused', async () => {
    const ref = fresh();
    await put(ref, CLAIM);
    const seen = (await get(ref, network.recorder)).body;
    expect(seen).not.toHaveProperty('costCents');
    expect(seen).toMatchObject({ labourMinutes: 60, decision: 'accepted' });
    expect((await get(ref, network.keys['AAA'])).status).toBe(403);
    expect((await get(ref, network.lead)).body.costCents).toBe(4500);
  });

  it('given a branch out of scope, does not exist', async () => {
    const token = network.manager;
    const path = '/api/branches/BBB/claims/x';
    expect((await app.call('get', path, { token })).status).toBe(404);
    expect((await app.call('put', path, { token, body: CLAIM })).status).toBe(404);
  });
});
