import { sql } from '#db/database';
import { verifyAudit } from '#db/queries/audit';
import { PASSWORD, TestApp } from '../support/app';

let app: TestApp;
let office: string;

beforeEach(async () => {
  app = await TestApp.start();
  office = await app.signIn('office@network.example', 'head_office');
  const put = async (path: string, body: unknown) => {
    const answer = await app.call('put', path, { token: office, body });
    expect(answer.status).toBe(201);
  };
  await put('/api/regions/COAST', { name: 'Coast' });
  await put('/api/regions/HILLS', { name: 'Hills' });
  for (const [code, region] of [
    ['AAA', 'COAST'],
    ['BBB', 'COAST'],
    ['CCC', 'HILLS'],
  ]) {
    const timeZone = 'Europe/Berlin';
    await put(`/api/branches/${code}`, { name: code, region, timeZone, openedOn: '2015-01-01' });
  }
});
afterEach(() => app.stop());

const post = (body: Record<string, unknown>, token: string = office) =>
  app.call('post', '/api/people', { token, body });
const change = (id: number, body: Record<string, unknown>, token: string = office) =>
  app.call('put', `/api/people/${id}`, { token, body });
const given = (more: Record<string, unknown>) => ({
  email: 'new@network.example',
  name: 'Ansa Moor',
  password: PASSWORD,
  ...more,
});
const signIn = (email: string) =>
  app.call('post', '/api/auth/sign-in', { body: { email, password: PASSWORD } });

describe('adding a person', () => {
  it('answers the person, who signs in with what they were given', async () => {
    const added = await post(given({ role: 'site_manager', branches: ['BBB', 'AAA', 'BBB'] }));
    expect(added.status).toBe(201);
    expect(added.body).toEqual({
      id: 2,
      email: 'new@network.example',
      name: 'Ansa Moor',
      role: 'site_manager',
      regions: [],
      branches: ['AAA', 'BBB'],
      active: true,
      invited: false,
      lastSignInAt: null,
    });
    const { body } = await signIn('new@network.example');
    expect(body.person).toMatchObject({
      role: 'site_manager',
      regions: [],
      branches: ['AAA', 'BBB'],
    });
    const catalogue = await app.call('get', '/api/catalogue', { token: body.accessToken });
    expect(catalogue.body.branches.map(({ code }: { code: string }) => code)).toEqual([
      'AAA',
      'BBB',
    ]);
  });

  it('of a region, gives the branches of that region', async () => {
    await post(given({ role: 'regional_lead', regions: ['COAST'] }));
    const { body } = await signIn('new@network.example');
    expect(body.person).toMatchObject({ regions: ['COAST'], branches: [] });
    const catalogue = await app.call('get', '/api/catalogue', { token: body.accessToken });
    expect(catalogue.body.branches.map(({ code }: { code: string }) => code)).toEqual([
      'AAA',
      'BBB',
    ]);
  });

  it('with places that do not fit the role, names each (rule 65)', async () => {
    const cases = [
      ['recorder', {}, ['/branches']],
      ['recorder', { regions: ['COAST'] }, ['/regions', '/branches']],
      ['recorder', { branches: ['AAA'], regions: ['COAST'] }, ['/regions']],
      ['site_manager', { branches: [] }, ['/branches']],
      ['regional_lead', {}, ['/regions']],
      ['regional_lead', { regions: ['COAST'], branches: ['AAA'] }, ['/branches']],
      ['head_office', { regions: ['COAST'] }, ['/regions']],
      ['head_office', { branches: ['AAA'] }, ['/branches']],
      ['regional_lead', { regions: ['COAST', 'NOPE', 'NADA'] }, ['/regions/1', '/regions/2']],
      ['recorder', { branches: ['aaa'] }, ['/branches/0']],
      ['recorder', { branches: ['COAST'] }, ['/branches/0']],
    ] as const;
    for (const [role, places, paths] of cases) {
      const answer = await post(given({ role, ...places }));
      const named = answer.body.problems.map(({ path }: { path: string }) => path);
      expect([role, places, answer.status, named]).toEqual([role, places, 422, paths]);
    }
    expect((await app.call('get', '/api/people', { token: office })).body.items).toHaveLength(1);
  });

  it('with problems of every kind, names all of them at once (rule 57)', async () => {
    const answer = await post({
      email: 'no address',
      name: ' ',
      role: 'recorder',
      regions: 'COAST',
      branches: ['NOPE', 7],
      password: 'short',
      salary: 1,
    });
    expect(answer.status).toBe(422);
    expect(answer.body.problems.map(({ path }: { path: string }) => path).sort()).toEqual([
      '/branches/0',
      '/branches/1',
      '/email',
      '/name',
      '/password',
      '/regions',
      '/salary',
    ]);
    const unknown = answer.body.problems.find(
      ({ path }: { path: string }) => path === '/branches/0',
    );
    expect(unknown.message).toBe('there is no branch with the code "NOPE"');
  });

  it('with an address somebody has in another spelling, answers 409', async () => {
    const answer = await post(given({ role: 'head_office', email: 'OFFICE@Network.example' }));
    expect(answer.status).toBe(409);
    expect(answer.headers.get('content-type')).toContain('application/problem+json');
  });

  it('twice at once, keeps one', async () => {
    const answers = await Promise.all([
      post(given({ role: 'head_office' })),
      post(given({ role: 'head_office', email: 'NEW@network.example' })),
    ]);
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409]);
  });
});

describe('listing people', () => {
  it('tells who has not set a password and when somebody last signed in', async () => {
    await post({ email: 'b@network.example', name: 'B', role: 'recorder', branches: ['AAA'] });
    const { body } = await app.call('get', '/api/people', { token: office });
    expect(body.items).toEqual([
      expect.objectContaining({ email: 'b@network.example', invited: true, lastSignInAt: null }),
      expect.objectContaining({
        email: 'office@network.example',
        invited: false,
        lastSignInAt: expect.stringMatching(/^\d{4}-.*Z$/),
      }),
    ]);
  });

  it('is for head office only, as are adding and changing', async () => {
    const others = [
      { email: 'r@network.example', role: 'recorder', branches: ['AAA'] },
      { email: 's@network.example', role: 'site_manager', branches: ['AAA'] },
      { email: 'l@network.example', role: 'regional_lead', regions: ['COAST'] },
    ];
    for (const other of others) {
      await post(given(other));
      const token: string = (await signIn(other.email)).body.accessToken;
      const statuses = [
        await app.call('get', '/api/people', { token }),
        await post({}, token),
        await change(1, {}, token),
      ].map(({ status }) => status);
      expect([other.role, statuses]).toEqual([other.role, [403, 403, 403]]);
    }
  });
});

describe('changing a person', () => {
  it('acts on their next request, not on their next token (rule 64)', async () => {
    const { body: person } = await post(given({ role: 'site_manager', branches: ['AAA'] }));
    const token: string = (await signIn('new@network.example')).body.accessToken;
    const seen = async () => {
      const { body } = await app.call('get', '/api/catalogue', { token });
      return body.branches.map(({ code }: { code: string }) => code);
    };
    expect(await seen()).toEqual(['AAA']);
    const moved = await change(person.id, { name: 'A', role: 'site_manager', branches: ['CCC'] });
    expect(moved.status).toBe(200);
    expect(moved.body).toMatchObject({ name: 'A', branches: ['CCC'], active: true });
    expect(await seen()).toEqual(['CCC']);
    await change(person.id, { name: 'A', role: 'regional_lead', regions: ['COAST'] });
    expect(await seen()).toEqual(['AAA', 'BBB']);
    const me = await app.call('get', '/api/auth/me', { token });
    expect(me.body).toMatchObject({ role: 'regional_lead', regions: ['COAST'], branches: [] });
  });

  it('to inactive, signs them out everywhere, for good', async () => {
    const { body: person } = await post(given({ role: 'recorder', branches: ['AAA'] }));
    const signed = await signIn('new@network.example');
    const token: string = signed.body.accessToken;
    const as = (active: boolean) =>
      change(person.id, { name: 'A', role: 'recorder', branches: ['AAA'], active });
    expect((await as(false)).body.active).toBe(false);
    expect((await app.call('get', '/api/auth/me', { token })).status).toBe(401);
    expect((await signIn('new@network.example')).status).toBe(401);
    expect((await as(true)).body.active).toBe(true);
    expect((await app.call('get', '/api/auth/me', { token })).status).toBe(401);
    expect((await signIn('new@network.example')).status).toBe(200);
  });

  it('checks the placing as adding does', async () => {
    const answer = await change(1, { name: 'A', role: 'recorder', branches: ['NOPE'], email: 'x' });
    expect(answer.status).toBe(422);
    expect(answer.body.problems.map(({ path }: { path: string }) => path)).toEqual([
      '/email',
      '/branches/0',
    ]);
  });

  it('who does not exist, answers 404', async () => {
    expect((await change(99, { name: 'A', role: 'head_office' })).status).toBe(404);
  });

  it('never leaves the network without somebody of head office who can sign in', async () => {
    const own = { name: 'Office', role: 'head_office' };
    for (const [body, path] of [
      [{ ...own, active: false }, '/active'],
      [{ ...own, role: 'recorder', branches: ['AAA'] }, '/role'],
    ] as const) {
      const answer = await change(1, body);
      expect([answer.status, answer.body.problems?.[0]?.path]).toEqual([422, path]);
    }
    // Somebody who was only invited cannot sign in yet.
    const invited = { email: 'i@network.example', name: 'I', role: 'head_office' };
    expect((await post(invited)).status).toBe(201);
    expect((await change(1, { ...own, active: false })).status).toBe(422);
    await post(given({ role: 'head_office' }));
    expect((await change(1, { ...own, active: false })).status).toBe(200);
  });

  it('when two of head office turn each other off at once, keeps one', async () => {
    const { body: other } = await post(given({ role: 'head_office' }));
    const off = { name: 'A', role: 'head_office', active: false };
    const answers = await Promise.all([change(1, off), change(other.id, off)]);
    // The second is refused as the last one, or no longer let in: its caller has just been turned off.
    const [done, refused] = answers.map(({ status }) => status).sort();
    expect(done).toBe(200);
    expect([401, 422]).toContain(refused);
    const active = app.kit.store.unscoped.all(
      sql('people').where({ role: 'head_office', active: 1 }),
    );
    expect(active).toHaveLength(1);
  });
});

describe('the trail', () => {
  it('tells who added and changed whom, and no secret', async () => {
    const { body: person } = await post(given({ role: 'recorder', branches: ['AAA'] }));
    await change(person.id, { name: 'Ansa Moor', role: 'site_manager', branches: ['AAA'] });
    const { unscoped } = app.kit.store;
    const events = unscoped.all<{ action: string; actor: string; subject: string; detail: string }>(
      sql('audit_events').where('action', 'like', 'person.%').orderBy('id'),
    );
    expect(events.map(({ action, actor, subject }) => [action, actor, subject])).toEqual([
      ['person.add', 'office@network.example', '/people/2'],
      ['person.change', 'office@network.example', '/people/2'],
    ]);
    expect(JSON.parse(events[1]!.detail)).toEqual({
      before: { name: 'Ansa Moor', role: 'recorder', regions: [], branches: ['AAA'], active: true },
      after: {
        name: 'Ansa Moor',
        role: 'site_manager',
        regions: [],
        branches: ['AAA'],
        active: true,
      },
    });
    const all = JSON.stringify(unscoped.all(sql('audit_events')));
    expect(all).not.toContain(PASSWORD);
    expect(all).not.toContain('$2b$');
    expect(verifyAudit(unscoped).brokenAt).toBeNull();
  });
});
