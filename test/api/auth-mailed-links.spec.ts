import { sql } from '#db/database';
import { advanceClock, holdClock } from '../support/advance-clock';
import { PASSWORD, TestApp } from '../support/app';
import { wholeAnswer } from '../support/whole-answer';

const EMAIL = 'office@network.example';
const NEW = 'another long password';
const HOUR = 3600;
let app: TestApp;
let office: string;

beforeEach(async () => {
  holdClock();
  app = await TestApp.start({ environment: { UNDERSEAM_URL: 'http://desk.example:8080/' } });
  office = await app.signIn(EMAIL, 'head_office');
});
afterEach(async () => {
  await app.stop();
  jest.useRealTimers();
});

const give = (email: string, password: string) =>
  app.call('post', '/api/auth/sign-in', { body: { email, password } });
const askReset = (email: string) =>
  app.call('post', '/api/auth/reset-request', { body: { email } });
const setPassword = (token: string, newPassword = NEW) =>
  app.call('post', '/api/auth/set-password', { body: { token, newPassword } });

interface Mail {
  to: string;
  subject: string;
  text: string;
}

async function mailbox(): Promise<Mail[]> {
  const token: string = (await give('postman@network.example', PASSWORD)).body?.accessToken;
  const answer = await app.call('get', '/api/mailbox', { token });
  expect(answer.status).toBe(200);
  return answer.body.items;
}

/** The token in the link of the newest mail. */
async function newestToken(purpose: string): Promise<string> {
  const [mail] = await mailbox();
  const found = /http:\/\/desk\.example:8080\/welcome\?token=([0-9a-f]{64})&purpose=(\w+)/.exec(
    mail?.text ?? '',
  );
  expect(found?.[2]).toBe(purpose);
  return found![1]!;
}

describe('a reset', () => {
  beforeEach(() => app.signIn('postman@network.example', 'head_office'));

  it('when asked for, mails a link with which the password is set once', async () => {
    const before = await give(EMAIL, PASSWORD);
    expect((await askReset(` ${EMAIL.toUpperCase()}`)).status).toBe(204);
    const mails = await mailbox();
    expect(mails.map(({ to, subject }) => ({ to, subject }))).toEqual([
      { to: EMAIL, subject: 'A new password for Underseam' },
    ]);
    const token = await newestToken('reset');

    const short = await setPassword(token, 'short');
    expect(short.body.problems[0].path).toBe('/newPassword');
    expect((await setPassword(token)).status).toBe(204);
    expect((await give(EMAIL, NEW)).status).toBe(200);
    expect((await give(EMAIL, PASSWORD)).status).toBe(401);
    const ended = await app.call('get', '/api/auth/me', { token: before.body.accessToken });
    expect(ended.status).toBe(401);

    const again = await setPassword(token, 'yet another password');
    expect(again.status).toBe(422);
    expect(again.body.problems).toEqual([
      { path: '/token', message: expect.stringContaining('used already or is too old') },
    ]);
    expect((await give(EMAIL, NEW)).status).toBe(200);
  });

  it('for an address nobody has, answers alike and mails nothing', async () => {
    const known = await askReset(EMAIL);
    const unknown = await askReset('nobody@network.example');
    expect(known.status).toBe(204);
    expect(wholeAnswer(unknown)).toBe(wholeAnswer(known));
    expect(await mailbox()).toHaveLength(1);
  });

  it('for somebody turned off, mails nothing', async () => {
    await app.kit.store.queue.write(() =>
      app.kit.store.unscoped.run(sql('people').where({ email: EMAIL }).update({ active: 0 })),
    );
    expect((await askReset(EMAIL)).status).toBe(204);
    expect(await mailbox()).toEqual([]);
  });

  it('after an hour, is too late', async () => {
    await askReset(EMAIL);
    const token = await newestToken('reset');
    advanceClock(HOUR + 1);
    expect((await setPassword(token)).status).toBe(422);
  });

  it('when asked for again and again, floods no mailbox', async () => {
    for (let time = 0; time < 8; time += 1) expect((await askReset(EMAIL)).status).toBe(204);
    expect(await mailbox()).toHaveLength(3);
    advanceClock(15 * 60 + 1);
    await askReset(EMAIL);
    expect(await mailbox()).toHaveLength(4);
  });

  it('once a password was set or changed, makes every earlier link worthless', async () => {
    await askReset(EMAIL);
    const first = await newestToken('reset');
    await askReset(EMAIL);
    const second = await newestToken('reset');
    expect((await setPassword(second)).status).toBe(204);
    expect((await setPassword(first)).status).toBe(422);

    await askReset(EMAIL);
    const third = await newestToken('reset');
    const { body } = await give(EMAIL, NEW);
    const change = { currentPassword: NEW, newPassword: PASSWORD };
    await app.call('post', '/api/auth/password', { token: body.accessToken, body: change });
    expect((await setPassword(third)).status).toBe(422);
  });

  it('lifts a lock-out', async () => {
    for (let time = 0; time < 10; time += 1) await give(EMAIL, 'not the password');
    expect((await give(EMAIL, PASSWORD)).status).toBe(429);
    await askReset(EMAIL);
    expect((await setPassword(await newestToken('reset'))).status).toBe(204);
    expect((await give(EMAIL, NEW)).status).toBe(200);
  });

  it('when one token is used twice at once, works once', async () => {
    await askReset(EMAIL);
    const token = await newestToken('reset');
    const answers = await Promise.all([
      setPassword(token),
      setPassword(token, 'the other one 123'),
    ]);
    expect(answers.map(({ status }) => status).sort()).toEqual([204, 422]);
  });

  it('keeps the token as a hash, and neither token nor password in the trail', async () => {
    await askReset(EMAIL);
    const token = await newestToken('reset');
    await setPassword(token);
    const { unscoped } = app.kit.store;
    const dump = JSON.stringify([
      unscoped.all(sql('password_tokens')),
      unscoped.all(sql('audit_events')),
      unscoped.all(sql('people')),
    ]);
    expect(dump).toContain('password.reset-request');
    expect(dump).toContain('password.set');
    for (const secret of [token, NEW, PASSWORD]) expect(dump).not.toContain(secret);
    const trail = JSON.stringify(unscoped.all(sql('audit_events')));
    const { password_hash: hash } = unscoped.first<{ password_hash: string }>(
      sql('people').where({ email: EMAIL }),
    )!;
    expect(trail).not.toContain(hash);
  });
});

describe('an invitation', () => {
  beforeEach(() => app.signIn('postman@network.example', 'head_office'));
  const invite = (email: string) =>
    app.call('post', '/api/people', {
      token: office,
      body: { email, name: 'Ansa <b>"Moor"</b>', role: 'head_office' },
    });

  it('mails a link for the first password, good for seven days', async () => {
    const added = await invite('new@network.example');
    expect(added.body).toMatchObject({ invited: true, lastSignInAt: null });
    expect((await give('new@network.example', '')).status).toBe(401);
    const token = await newestToken('invitation');
    advanceClock(7 * 24 * HOUR - 60);
    expect((await setPassword(token)).status).toBe(204);
    expect((await give('new@network.example', NEW)).status).toBe(200);
  });

  it('after seven days, is too late, and a reset can be asked for instead', async () => {
    await invite('new@network.example');
    const token = await newestToken('invitation');
    advanceClock(7 * 24 * HOUR + 1);
    expect((await setPassword(token)).status).toBe(422);
    await askReset('new@network.example');
    expect((await setPassword(await newestToken('reset'))).status).toBe(204);
  });

  it('when the person is turned off meanwhile, works no more', async () => {
    const { body: person } = await invite('new@network.example');
    const token = await newestToken('invitation');
    const { body } = await give(EMAIL, PASSWORD);
    const turn = (active: boolean) =>
      app.call('put', `/api/people/${person.id}`, {
        token: body.accessToken,
        body: { name: 'New', role: 'head_office', active },
      });
    expect((await turn(false)).status).toBe(200);
    expect((await setPassword(token)).status).toBe(422);
    await turn(true);
    expect((await setPassword(token)).status).toBe(422);
  });
});

describe('the local mailbox', () => {
  it('is for head office only', async () => {
    await app.signIn('postman@network.example', 'head_office');
    await askReset(EMAIL);
    expect((await app.call('get', '/api/mailbox')).status).toBe(401);
    await app.kit.store.queue.write(() =>
      app.kit.store.unscoped.run(
        sql('people').where({ email: EMAIL }).update({ role: 'site_manager' }),
      ),
    );
    expect((await app.call('get', '/api/mailbox', { token: office })).status).toBe(403);
    expect(await mailbox()).toHaveLength(1);
  });

  it('with an SMTP server configured, does not exist', async () => {
    const sending = await TestApp.start({ environment: { SMTP_URL: 'smtp://127.0.0.1:9' } });
    try {
      const token = await sending.signIn(EMAIL, 'head_office');
      expect((await sending.call('get', '/api/mailbox', { token })).status).toBe(404);
    } finally {
      await sending.stop();
    }
  });
});
