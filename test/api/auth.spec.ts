import jwt from 'jsonwebtoken';
import { createSecretKey } from 'node:crypto';
import { sql } from '#db/database';
import { issueAccessToken } from '#server/auth/access-token';
import { readSecret } from '#server/auth/secret';
import { advanceClock, holdClock } from '../support/advance-clock';
import { PASSWORD, TestApp, type Answer } from '../support/app';

const EMAIL = 'office@network.example';
const MINUTE = 60;
const DAY = 24 * 3600;
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

/** The refresh cookie of an answer, as a browser would send it back. */
function cookieOf(answer: Answer): string {
  const [cookie = ''] = answer.headers.getSetCookie();
  return cookie.split(';')[0] ?? '';
}

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
      told.add(
        JSON.stringify([answer.text, [...answer.headers].filter(([name]) => name !== 'date')]),
      );
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

describe('an access token', () => {
  it('after ten minutes, is worth nothing', async () => {
    const { body } = await give(EMAIL, PASSWORD);
    advanceClock(9 * MINUTE + 50);
    expect((await me(body.accessToken)).status).toBe(200);
    advanceClock(20);
    expect((await me(body.accessToken)).status).toBe(401);
  });

  it('when the business clock stands still, lives by the machine (rule 63)', async () => {
    const fixed = await TestApp.start({ now: '2020-01-01T00:00:00Z' });
    try {
      const token = await fixed.signIn(EMAIL, 'head_office');
      expect((await fixed.call('get', '/api/auth/me', { token })).status).toBe(200);
    } finally {
      await fixed.stop();
    }
  });

  it('when absent or in another form, is refused with a problem', async () => {
    const headers = ['', 'Bearer', 'Bearer ', 'Basic b2ZmaWNlOng=', 'Bearer not.a.token'];
    for (const authorization of [...headers, `Bearer ${'a'.repeat(9000)}`]) {
      const answer = await app.call('get', '/api/auth/me', { headers: { authorization } });
      expect([authorization, answer.status]).toEqual([authorization, 401]);
      expect(answer.headers.get('content-type')).toContain('application/problem+json');
      expect(answer.headers.get('www-authenticate')).toBe('Bearer');
    }
  });

  it('when forged, is refused', async () => {
    const { tokens, cookies } = readSecret(app.kit.config);
    const claims = { personId: 1, signInId: 1 };
    const good = issueAccessToken(tokens, claims, new Date());
    expect((await me(good)).status).toBe(200);

    const [header, payload, signature] = good.split('.') as [string, string, string];
    const none = Buffer.from('{"alg":"none","typ":"JWT"}').toString('base64url');
    const other = Buffer.from('{"sub":"2","sid":1,"iat":1,"exp":9999999999}').toString('base64url');
    const forged = {
      'signed by another key': issueAccessToken(
        createSecretKey(Buffer.alloc(32)),
        claims,
        new Date(),
      ),
      'signed by the cookie key': issueAccessToken(cookies, claims, new Date()),
      unsigned: `${none}.${payload}.`,
      'with another payload': `${header}.${other}.${signature}`,
      'of another algorithm': jwt.sign({ sub: '1', sid: 1 }, tokens, { algorithm: 'HS512' }),
      'of another person': issueAccessToken(tokens, { personId: 2, signInId: 1 }, new Date()),
      'of no sign-in': issueAccessToken(tokens, { personId: 1, signInId: 999 }, new Date()),
      'without a sign-in': jwt.sign({ sub: '1' }, tokens, { expiresIn: 600 }),
      'with a list as its subject': jwt.sign({ sub: ['1'] as never, sid: 1 }, tokens, {
        expiresIn: 600,
      }),
    };
    for (const [what, token] of Object.entries(forged)) {
      expect([what, (await me(token)).status]).toEqual([what, 401]);
    }
  });

  it('when role, scope or activity change, allows what they allow at the next request (rule 64)', async () => {
    const token = (await give(EMAIL, PASSWORD)).body.accessToken;
    const set = (change: Record<string, unknown>) =>
      app.kit.store.queue.write(() =>
        app.kit.store.unscoped.run(sql('people').where({ id: 1 }).update(change)),
      );
    expect((await app.call('get', '/api/people', { token })).status).toBe(200);
    await set({ role: 'recorder' });
    expect((await app.call('get', '/api/people', { token })).status).toBe(403);
    await set({ role: 'head_office', active: 0 });
    expect((await app.call('get', '/api/people', { token })).status).toBe(401);
  });
});

describe('refresh', () => {
  it('given the newest cookie, answers a new token and a new cookie, thirty days from then', async () => {
    const first = await give(EMAIL, PASSWORD);
    advanceClock(29 * DAY);
    const second = await refresh(cookieOf(first));
    expect(second.status).toBe(200);
    expect(second.body.person).toEqual(first.body.person);
    expect(cookieOf(second)).toMatch(/=\d+\.2\./);
    expect((await me(second.body.accessToken)).status).toBe(200);
    advanceClock(29 * DAY);
    const third = await refresh(cookieOf(second));
    expect(third.status).toBe(200);
    advanceClock(30 * DAY + 1);
    expect((await refresh(cookieOf(third))).status).toBe(401);
  });

  it('given a cookie whose answer was lost, returns the same successor until that has been used (rule 83)', async () => {
    const first = cookieOf(await give(EMAIL, PASSWORD));
    const lost = await refresh(first);
    const again = await refresh(first);
    expect(again.status).toBe(200);
    expect(cookieOf(again)).toBe(cookieOf(lost));

    const successor = await refresh(cookieOf(again));
    expect(successor.status).toBe(200);
    // The successor has been used: whoever shows the old one now has copied it.
    expect((await refresh(first)).status).toBe(401);
    expect((await refresh(cookieOf(successor))).status).toBe(401);
    expect((await me(successor.body.accessToken)).status).toBe(401);
  });

  it('given one cookie many times at once, gives everybody the same successor', async () => {
    const first = cookieOf(await give(EMAIL, PASSWORD));
    const answers = await Promise.all(Array.from({ length: 8 }, () => refresh(first)));
    expect(new Set(answers.map(({ status }) => status))).toEqual(new Set([200]));
    expect(new Set(answers.map(cookieOf)).size).toBe(1);
  });

  it('given a cookie that was not issued, answers 401 and ends nothing', async () => {
    const good = cookieOf(await give(EMAIL, PASSWORD));
    const [id, , mac] = good.split('=')[1]!.split('.') as [string, string, string];
    const bad = [
      '',
      'underseam_refresh=',
      'underseam_refresh=1.1.x',
      `underseam_refresh=${id}.2.${mac}`,
      `underseam_refresh=${id}.0.${mac}`,
      `underseam_refresh=999.1.${mac}`,
      `underseam_refresh=${id}.1.${'0'.repeat(64)}`,
      `other=${good.split('=')[1]!}`,
      'underseam_refresh=9999999999999999999999.1.ab',
    ];
    for (const cookie of bad) {
      const answer = await refresh(cookie);
      expect([cookie, answer.status]).toEqual([cookie, 401]);
    }
    expect((await refresh(`theme=dark; ${good}; x=1`)).status).toBe(200);
  });

  it('after the same sign-in number was given to somebody else (a restored backup), refuses the old cookie', async () => {
    const old = cookieOf(await give(EMAIL, PASSWORD));
    advanceClock(5);
    await app.kit.store.queue.write(() =>
      app.kit.store.unscoped.run(sql('sign_ins').update({ started_at: new Date().toISOString() })),
    );
    expect((await refresh(old)).status).toBe(401);
  });
});

describe('signing out', () => {
  it('here, ends this sign-in at once and clears the cookie', async () => {
    const here = await give(EMAIL, PASSWORD);
    const elsewhere = await give(EMAIL, PASSWORD);
    const out = await app.call('post', '/api/auth/sign-out', {
      headers: { cookie: cookieOf(here) },
    });
    expect(out.status).toBe(204);
    expect(out.headers.getSetCookie()[0]).toMatch(
      /^underseam_refresh=; Max-Age=0; Path=\/api\/auth;/,
    );
    expect((await me(here.body.accessToken)).status).toBe(401);
    expect((await refresh(cookieOf(here))).status).toBe(401);
    expect((await me(elsewhere.body.accessToken)).status).toBe(200);
  });

  it('without a cookie or with a made-up one, answers 204 and ends nothing', async () => {
    const here = await give(EMAIL, PASSWORD);
    for (const cookie of ['', `underseam_refresh=2.1.${'0'.repeat(64)}`]) {
      const out = await app.call('post', '/api/auth/sign-out', { headers: { cookie } });
      expect(out.status).toBe(204);
    }
    expect((await me(here.body.accessToken)).status).toBe(200);
  });

  it('everywhere, ends every sign-in of this person and of nobody else', async () => {
    const other = await app.signIn('other@network.example', 'head_office');
    const here = await give(EMAIL, PASSWORD);
    const elsewhere = await give(EMAIL, PASSWORD);
    const token: string = here.body.accessToken;
    expect((await app.call('delete', '/api/auth/sign-ins', { token })).status).toBe(204);
    for (const answer of [here, elsewhere]) {
      expect((await me(answer.body.accessToken)).status).toBe(401);
      expect((await refresh(cookieOf(answer))).status).toBe(401);
    }
    expect((await me(other)).status).toBe(200);
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
    expect((await refresh(cookieOf(here))).status).toBe(200);
    expect((await me(elsewhere.body.accessToken)).status).toBe(401);
    expect((await refresh(cookieOf(elsewhere))).status).toBe(401);
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
