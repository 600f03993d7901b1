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
const at = (ref: string): string => `/api/branches/AAA/jobs/${ref}`;
const send = (
  method: string,
  path: string,
  headers: Record<string, string> = {},
  body: unknown = validJob(),
): Promise<Answer> =>
  app.call(method, path, {
    token: network.manager,
    headers,
    ...(method !== 'delete' && { body }),
  });
const tagOf = async (ref: string): Promise<string> =>
  (await app.call('get', at(ref), { token: network.manager })).headers.get('etag') ?? '';
async function stored(): Promise<string> {
  const ref = `tag-${(next += 1)}`;
  await send('put', at(ref));
  return ref;
}
/** The refusal names who made the change and when. */
function expectLost(answer: Answer, who = 'manager@network.example'): void {
  expect(answer.status).toBe(412);
  expect(answer.body).toMatchObject({ status: 412, detail: expect.stringContaining(who) });
  expect(answer.body.detail).toMatch(/20\d\d-\d\d-\d\dT\d\d:\d\d/);
}

describe('The ETag of a job (rule 73)', () => {
  it('given a read, a write and a correction, is there, is strong and follows the revision', async () => {
    const ref = `tag-${(next += 1)}`;
    const made = await send('put', at(ref));
    const tag = await tagOf(ref);
    expect(tag).toMatch(/^"[^"]+"$/);
    expect(made.headers.get('etag')).toBe(tag);
    const corrected = await send('put', at(ref), {}, validJob({ notes: 'x' }));
    expect(corrected.headers.get('etag')).not.toBe(tag);
    expect(await tagOf(ref)).toBe(corrected.headers.get('etag'));
  });
});

describe('GET with If-None-Match', () => {
  it('given the tag of a revision whose figures were restated, answers them and not "unchanged"', async () => {
    const ref = await stored();
    // Said, because fetch would otherwise forbid the short answer by itself.
    const headers = { 'if-none-match': await tagOf(ref), 'cache-control': 'max-age=0' };
    const token = network.office;
    const body = { hourlyCostCents: 7200 };
    await app.call('put', '/api/branches/AAA/rates/2026-01-01', { token, body });
    const answer = await app.call('get', at(ref), { token: network.manager, headers });
    expect([answer.status, answer.body.money.labourCents]).toEqual([200, 88_200]);
  });
});

describe('PUT with If-Match (rule 73)', () => {
  it('given the present tag, takes the correction; given it again, names who was faster', async () => {
    const ref = await stored();
    const tag = await tagOf(ref);
    const headers = { 'if-match': tag };
    const first = await send('put', at(ref), headers, validJob({ notes: 'a' }));
    expect(first.body.status).toBe('replaced');
    expectLost(await send('put', at(ref), headers, validJob({ notes: 'b' })));
    const sheet = await app.call('get', at(ref), { token: network.manager });
    expect(sheet.body.notes).toBe('a');
  });

  it('given a change by a push key, names the key', async () => {
    const ref = await stored();
    const tag = await tagOf(ref);
    const body = validJob({ notes: 'pushed' });
    await app.call('put', at(ref), { token: network.keys['AAA'], body });
    expectLost(await send('put', at(ref), { 'if-match': tag }), 'test system');
  });

  it('given two writers at once with one tag, lets one through', async () => {
    const ref = await stored();
    const headers = { 'if-match': await tagOf(ref) };
    const answers = await Promise.all(
      ['a', 'b', 'c'].map((notes) => send('put', at(ref), headers, validJob({ notes }))),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 412, 412]);
    // The losers are told of the change that they lost to, though it was committed together with their refusal.
    for (const { status, body } of answers) {
      if (status === 412) expect(body.detail).toContain('revision 2 by manager@network.example');
    }
  });

  it('given a job that was never there, refuses and stores nothing', async () => {
    const ref = `tag-${(next += 1)}`;
    expect((await send('put', at(ref), { 'if-match': '"r1"' })).status).toBe(412);
    expect((await send('put', at(ref), { 'if-match': '*' })).status).toBe(412);
    expect(await tagOf(ref)).not.toMatch(/^"r/);
  });

  it('given a job voided meanwhile, names who voided it', async () => {
    const ref = await stored();
    const tag = await tagOf(ref);
    await app.call('delete', at(ref), { token: network.office });
    const body = validJob({ notes: 'x' });
    expectLost(await send('put', at(ref), { 'if-match': tag }, body), 'office@network.example');
    expectLost(await send('put', at(ref), { 'if-match': tag }), 'office@network.example');
  });
});

describe('PUT with If-None-Match: * (rule 73)', () => {
  it('given nothing there, creates it; given something there, names who made it', async () => {
    const ref = `tag-${(next += 1)}`;
    const headers = { 'if-none-match': '*' };
    expect((await send('put', at(ref), headers)).status).toBe(201);
    expectLost(await send('put', at(ref), headers));
    expectLost(await send('put', at(ref), headers, validJob({ notes: 'other' })));
  });
});

describe('DELETE and the bill with If-Match', () => {
  it('given an old tag, leave the job as it is', async () => {
    const ref = await stored();
    const tag = await tagOf(ref);
    await send('put', at(ref), {}, validJob({ notes: 'x' }));
    const bill = { issuedOn: '2026-01-30', totalCents: 1 };
    expectLost(await send('delete', at(ref), { 'if-match': tag }));
    expectLost(await send('put', `${at(ref)}/invoice`, { 'if-match': tag }, bill));
    const present = { 'if-match': await tagOf(ref) };
    expect((await send('put', `${at(ref)}/invoice`, present, bill)).status).toBe(200);
    expect((await send('delete', at(ref), { 'if-match': await tagOf(ref) })).status).toBe(204);
  });
});

describe('A claim with If-Match', () => {
  it('given an old tag, names who changed it and when', async () => {
    const ref = await stored();
    const claim = {
      jobRef: ref,
      madeOn: '2026-01-30',
      zone: 'floor',
      cause: 'damage',
      decision: 'open',
      labourMinutes: 0,
      productMl: 0,
      costCents: 0,
    };
    const path = `/api/branches/AAA/claims/${ref}`;
    const made = await send('put', path, { 'if-none-match': '*' }, claim);
    expect(made.status).toBe(201);
    const tag = made.headers.get('etag') ?? '';
    expectLost(await send('put', path, { 'if-none-match': '*' }, claim));
    const next = await send('put', path, { 'if-match': tag }, { ...claim, zone: 'tailgate' });
    expect(next.body).toMatchObject({ revision: 2, status: 'replaced' });
    expectLost(await send('put', path, { 'if-match': tag }, claim));
  });
});
