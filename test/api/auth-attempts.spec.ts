import { sql } from '#db/database';
import { advanceClock, holdClock } from '../support/advance-clock';
import { PASSWORD, TestApp } from '../support/app';

const EMAIL = 'office@network.example';
const QUARTER_HOUR = 15 * 60;
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

async function fail(email: string, times: number): Promise<number[]> {
  const statuses: number[] = [];
  for (let time = 0; time < times; time += 1) {
    statuses.push((await give(email, 'not the password')).status);
  }
  return statuses;
}

const lockOuts = () =>
  app.kit.store.unscoped.all(
    sql('audit_events').where({ action: 'sign-in.lock-out' }).select('subject', 'actor'),
  );

describe('lock-out', () => {
  it.each([EMAIL, 'nobody@network.example'])(
    'after ten failures with %s, refuses for a quarter of an hour, the right password too',
    async (email) => {
      expect(await fail(email, 10)).toEqual(Array<number>(10).fill(401));
      const locked = await give(email.toUpperCase(), PASSWORD);
      expect(locked.status).toBe(429);
      expect(locked.headers.get('content-type')).toContain('application/problem+json');
      expect(locked.headers.get('retry-after')).toBe('900');

      advanceClock(QUARTER_HOUR - 10);
      const still = await give(email, PASSWORD);
      expect([still.status, still.headers.get('retry-after')]).toEqual([429, '10']);
      advanceClock(11);
      expect((await give(email, PASSWORD)).status).toBe(email === EMAIL ? 200 : 401);
      expect(lockOuts()).toEqual(email === EMAIL ? [{ subject: '/people/1', actor: EMAIL }] : []);
    },
  );

  it('when somebody else fails, touches nobody but them', async () => {
    await fail('nobody@network.example', 10);
    expect((await give(EMAIL, PASSWORD)).status).toBe(200);
  });

  it('after a success, counts from nothing again', async () => {
    await fail(EMAIL, 9);
    expect((await give(EMAIL, PASSWORD)).status).toBe(200);
    expect(await fail(EMAIL, 9)).toEqual(Array<number>(9).fill(401));
    expect((await give(EMAIL, PASSWORD)).status).toBe(200);
    expect(lockOuts()).toEqual([]);
  });

  it('when failures are spread over more than a quarter of an hour, counts the newer only', async () => {
    await fail(EMAIL, 9);
    advanceClock(QUARTER_HOUR + 1);
    await fail(EMAIL, 9);
    expect((await give(EMAIL, PASSWORD)).status).toBe(200);
  });

  it('when many try at once, lets ten through', async () => {
    const answers = await Promise.all(
      Array.from({ length: 25 }, () => give(EMAIL, 'not the password')),
    );
    const statuses = answers.map(({ status }) => status).sort();
    expect(statuses).toEqual([...Array<number>(10).fill(401), ...Array<number>(15).fill(429)]);
  });

  it('when a token is used to guess the password, locks that too', async () => {
    const token: string = (await give(EMAIL, PASSWORD)).body.accessToken;
    const guess = () =>
      app.call('post', '/api/auth/password', {
        token,
        body: { currentPassword: 'not the password', newPassword: 'another long password' },
      });
    for (let time = 0; time < 10; time += 1) expect((await guess()).status).toBe(422);
    expect((await guess()).status).toBe(429);
  });

  it('keeps no address as it was typed', async () => {
    await fail('my-password-by-mistake', 1);
    const rows = app.kit.store.unscoped.all<{ email_key: string }>(sql('sign_in_failures'));
    expect(rows).toHaveLength(1);
    expect(rows[0]!.email_key).toMatch(/^[0-9a-f]{64}$/);
  });
});

describe('the limit per network address', () => {
  it('after a hundred failures over many addresses, refuses with 429 as a problem', async () => {
    for (let time = 0; time < 100; time += 1) {
      expect((await give(`nobody${time}@network.example`, 'not the password')).status).toBe(401);
    }
    const refused = await give('nobody-else@network.example', 'not the password');
    expect(refused.status).toBe(429);
    expect(refused.headers.get('content-type')).toContain('application/problem+json');
    expect(refused.headers.get('retry-after')).toBe('900');
    expect(refused.body).toMatchObject({ status: 429, title: 'Too many attempts' });
    const token = await app.call('post', '/api/auth/set-password', {
      body: { token: 'x', newPassword: 'another long password' },
    });
    expect(token.status).toBe(429);
  });

  it('when sign-ins succeed, does not count them', async () => {
    for (let time = 0; time < 105; time += 1) {
      expect((await give(EMAIL, PASSWORD)).status).toBe(200);
    }
  });

  it('after a hundred reset mails asked for, refuses more', async () => {
    const ask = (email: string) => app.call('post', '/api/auth/reset-request', { body: { email } });
    for (let time = 0; time < 100; time += 1) {
      expect((await ask(`nobody${time}@network.example`)).status).toBe(204);
    }
    expect((await ask(EMAIL)).status).toBe(429);
  });
});
