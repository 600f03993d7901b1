import { createHmac, createSecretKey, type KeyObject } from 'node:crypto';
import { sql } from '#db/database';
import { issueAccessToken } from '#server/auth/access-token';
import { readSecret } from '#server/auth/secret';
import { advanceClock, holdClock } from '../support/advance-clock';
import { PASSWORD, TestApp } from '../support/app';

const EMAIL = 'office@network.example';
const MINUTE = 60;
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
const me = (token: string) => app.call('get', '/api/auth/me', { token });

const encoded = (text: string) => Buffer.from(text).toString('base64url');

/** A token made by hand (RFC 7515, 3.1), so that what is refused does not rest on the library that checks it. */
function signed(header: string, payload: string, key: KeyObject, hash = 'sha256'): string {
  const text = `${encoded(header)}.${encoded(payload)}`;
  return `${text}.${createHmac(hash, key).update(text).digest('base64url')}`;
}

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
    const now = new Date();
    const good = issueAccessToken(tokens, claims, now);
    const [header, payload, signature] = good.split('.') as [string, string, string];
    const HS256 = '{"alg":"HS256","typ":"JWT"}';
    const said = (person: string) => `{"sub":${person},"sid":1,"iat":1,"exp":9999999999}`;
    expect((await me(signed(HS256, said('"1"'), tokens))).status).toBe(200);

    const forged = {
      'signed by another key': issueAccessToken(createSecretKey(Buffer.alloc(32)), claims, now),
      'signed by the cookie key': issueAccessToken(cookies, claims, now),
      unsigned: `${encoded('{"alg":"none","typ":"JWT"}')}.${payload}.`,
      'with another payload': `${header}.${encoded(said('"2"'))}.${signature}`,
      'of another algorithm': signed('{"alg":"HS512","typ":"JWT"}', said('"1"'), tokens, 'sha512'),
      'of another person': issueAccessToken(tokens, { personId: 2, signInId: 1 }, now),
      'of no sign-in': issueAccessToken(tokens, { personId: 1, signInId: 999 }, now),
      'without a sign-in': signed(HS256, '{"sub":"1","exp":9999999999}', tokens),
      'with a list as its person': signed(HS256, said('["1"]'), tokens),
      'with a number as its person': signed(HS256, said('1'), tokens),
      'with text as its payload': signed(HS256, '"1"', tokens),
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
