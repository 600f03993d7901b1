import { sql } from '#db/database';
import { advanceClock, holdClock } from '../support/advance-clock';
import { PASSWORD, TestApp } from '../support/app';
import { refreshCookie } from '../support/refresh-cookie';
import { wholeAnswer } from '../support/whole-answer';

const EMAIL = 'office@network.example';
let app: TestApp;

beforeEach(async () => {
  holdClock();
  app = await TestApp.start();
  await app.signIn(EMAIL, 'head_office');
});
afterEach(async () => {
  await app.stop();
  jest.useRealTimers();
});

const give = (email: string, password: string) =>
  app.call('post', '/api/auth/sign-in', { body: { email, password } });
const refresh = (cookie: string) => app.call('post', '/api/auth/refresh', { headers: { cookie } });
const me = (token: string) => app.call('get', '/api/auth/me', { token });

describe('sign-in', () => {
  it('given the right pair, answers a token, its life, the person, and sets the cookie', async () => {
    const answer = await give(EMAIL, PASSWORD);
    expect(answer.status).toBe(200);
    expect(answer.body).toEqual({
      accessToken: expect.any(String),
      expiresInSeconds: 600,
      person: {
        id: 1,
        email: EMAIL,
        name: EMAIL,
        role: 'head_office',
        regions: [],
        branches: [],
      },
    });
    const [cookie] = answer.headers.getSetCookie();
    expect(cookie).toMatch(
      /^underseam_refresh=\d+\.1\.[0-9a-f]{64}; Max-Age=2592000; Path=\/api\/auth; HttpOnly; SameSite=Strict$/,
    );
    expect(answer.headers.get('cache-control')).toBe('no-store');
    expect((await me(answer.body.accessToken)).body).toEqual(answer.body.person);
  });

  it('given another spelling of the address, knows the person', async () => {
    expect((await give(`  ${EMAIL.toUpperCase()} `, PASSWORD)).status).toBe(200);
  });

  it('given a wrong pair of any kind, gives the same answer after the same work', async () => {
    const nobody = await app.call('post', '/api/people', {
      token: await app.signIn('other@network.example', 'head_office'),
      body: { email: 'invited@network.example', name: 'Invited', role: 'head_office' },
    });
    expect(nobody.status).toBe(201);
    await app.kit.store.queue.write(() =>
      app.kit.store.unscoped.run(
        sql('people').where({ email: 'other@network.example' }).update({ active: 0 }),
      ),
    );
    const matches = jest.spyOn(app.kit.passwords, 'matches');
    const pairs: [string, string][] = [
      [EMAIL, 'not the password'],
      ['nobody@network.example', PASSWORD],
      ['other@network.example', PASSWORD],
      ['invited@network.example', PASSWORD],
      ['', ''],
    ];
    const told = new Set<string>();
    for (const [email, password] of pairs) {
      const answer = await give(email, password);
      expect(answer.status).toBe(401);
      expect(answer.headers.getSetCookie()).toEqual([]);
      told.add(wholeAnswer(answer));
    }
    expect(told.size).toBe(1);
    expect([...told][0]).toContain('application/problem+json');
    expect(matches).toHaveBeenCalledTimes(pairs.length);
  });

  it('given a body of another shape, names every problem', async () => {
    const answer = await app.call('post', '/api/auth/sign-in', { body: { mail: 'x' } });
    expect(answer.status).toBe(422);
    expect(answer.body.problems.map(({ path }: { path: string }) => path).sort()).toEqual([
      '/email',
      '/mail',
      '/password',
    ]);
  });

  it('when the product is opened over https, marks the cookie Secure', async () => {
    const secure = await TestApp.start({ environment: { UNDERSEAM_URL: 'https://a.example' } });
    try {
      await secure.signIn(EMAIL, 'head_office');
      const answer = await secure.call('post', '/api/auth/sign-in', {
        body: { email: EMAIL, password: PASSWORD },
      });
      expect(answer.headers.getSetCookie()[0]).toMatch(/; Secure$/);
    } finally {
      await secure.stop();
    }
  });
});

describe('the own account', () => {
  it('lists the own open sign-ins, last used first, and marks this one', async () => {
    await app.signIn('other@network.example', 'head_office');
    advanceClock(60);
    const phone = await app.call('post', '/api/auth/sign-in', {
      body: { email: EMAIL, password: PASSWORD },
      headers: { 'user-agent': `Phone ${'x'.repeat(500)}` },
    });
    const { body } = await app.call('get', '/api/auth/sign-ins', { token: phone.body.accessToken });
    expect(body.items).toEqual([
      {
        id: 3,
        device: expect.stringMatching(/^Phone x{194}$/),
        startedAt: expect.stringMatching(/Z$/),
        lastUsedAt: expect.stringMatching(/Z$/),
        current: true,
      },
      expect.objectContaining({ id: 1, current: false }),
    ]);
  });

  it('takes a new name', async () => {
    const token: string = (await give(EMAIL, PASSWORD)).body.accessToken;
    const put = await app.call('put', '/api/auth/me', { token, body: { name: 'Öre Æsk' } });
    expect(put.body).toMatchObject({ id: 1, name: 'Öre Æsk' });
    expect((await me(token)).body.name).toBe('Öre Æsk');
    const bad = await app.call('put', '/api/auth/me', { token, body: { name: ' ' } });
    expect(bad.status).toBe(422);
  });

  it('takes a new password: the old one and every other sign-in end, this one stays', async () => {
    const here = await give(EMAIL, PASSWORD);
    const elsewhere = await give(EMAIL, PASSWORD);
    const token: string = here.body.accessToken;
    const change = (currentPassword: string, newPassword: string) =>
      app.call('post', '/api/auth/password', { token, body: { currentPassword, newPassword } });

    const wrong = await change('not my password', 'another long password');
    expect(wrong.status).toBe(422);
    expect(wrong.body.problems).toEqual([
      { path: '/currentPassword', message: 'is not the current password' },
    ]);
    expect((await change(PASSWORD, 'too short')).body.problems[0].path).toBe('/newPassword');
    expect((await change(PASSWORD, 'ä'.repeat(37))).body.problems[0].path).toBe('/newPassword');
    expect((await me(elsewhere.body.accessToken)).status).toBe(200);

    expect((await change(PASSWORD, 'another long password')).status).toBe(204);
    expect((await me(token)).status).toBe(200);
    expect((await refresh(refreshCookie(here))).status).toBe(200);
    expect((await me(elsewhere.body.accessToken)).status).toBe(401);
    expect((await refresh(refreshCookie(elsewhere))).status).toBe(401);
    expect((await give(EMAIL, PASSWORD)).status).toBe(401);
    expect((await give(EMAIL, 'another long password')).status).toBe(200);
  });

  it('is not for a push key', async () => {
    const answer = await app.call('get', '/api/auth/me', {
      token: `usk_${'0'.repeat(12)}_${'0'.repeat(64)}`,
    });
    expect(answer.status).toBe(401);
  });
});
