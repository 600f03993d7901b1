import { sql } from '#db/database';
import { advanceClock, holdClock } from '../support/advance-clock';
import { PASSWORD, TestApp } from '../support/app';
import { refreshCookie } from '../support/refresh-cookie';

const EMAIL = 'office@network.example';
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

describe('refresh', () => {
  it('given the newest cookie, answers a new token and a new cookie, thirty days from then', async () => {
    const first = await give(EMAIL, PASSWORD);
    advanceClock(29 * DAY);
    const second = await refresh(refreshCookie(first));
    expect(second.status).toBe(200);
    expect(second.body.person).toEqual(first.body.person);
    expect(refreshCookie(second)).toMatch(/=\d+\.2\./);
    expect((await me(second.body.accessToken)).status).toBe(200);
    advanceClock(29 * DAY);
    const third = await refresh(refreshCookie(second));
    expect(third.status).toBe(200);
    advanceClock(30 * DAY + 1);
    expect((await refresh(refreshCookie(third))).status).toBe(401);
  });

  it('given a cookie whose answer was lost, returns the same successor until that has been used (rule 83)', async () => {
    const first = refreshCookie(await give(EMAIL, PASSWORD));
    const lost = await refresh(first);
    const again = await refresh(first);
    expect(again.status).toBe(200);
    expect(refreshCookie(again)).toBe(refreshCookie(lost));

    const successor = await refresh(refreshCookie(again));
    expect(successor.status).toBe(200);
    // The successor has been used: whoever shows the old one now has copied it.
    expect((await refresh(first)).status).toBe(401);
    expect((await refresh(refreshCookie(successor))).status).toBe(401);
    expect((await me(successor.body.accessToken)).status).toBe(401);
  });

  it('given one cookie many times at once, gives everybody the same successor', async () => {
    const first = refreshCookie(await give(EMAIL, PASSWORD));
    const answers = await Promise.all(Array.from({ length: 8 }, () => refresh(first)));
    expect(new Set(answers.map(({ status }) => status))).toEqual(new Set([200]));
    expect(new Set(answers.map(refreshCookie)).size).toBe(1);
  });

  it('given a cookie that was not issued, answers 401 and ends nothing', async () => {
    const good = refreshCookie(await give(EMAIL, PASSWORD));
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
    const old = refreshCookie(await give(EMAIL, PASSWORD));
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
      headers: { cookie: refreshCookie(here) },
    });
    expect(out.status).toBe(204);
    expect(out.headers.getSetCookie()[0]).toMatch(
      /^underseam_refresh=; Max-Age=0; Path=\/api\/auth;/,
    );
    expect((await me(here.body.accessToken)).status).toBe(401);
    expect((await refresh(refreshCookie(here))).status).toBe(401);
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
      expect((await refresh(refreshCookie(answer))).status).toBe(401);
    }
    expect((await me(other)).status).toBe(200);
  });
});
