import pino from 'pino';
import { sql } from '#db/database';
import { DigestRuns } from '#server/schedule/digest-runs';
import { TestApp } from '../support/app';
import { PostOffice } from '../support/post-office';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let post: PostOffice;
let app: TestApp;
let people: SmallNetwork;

beforeEach(async () => {
  post = new PostOffice();
  const environment = {
    SMTP_URL: `smtp://127.0.0.1:${await post.open()}`,
    UNDERSEAM_URL: 'https://desk.example',
  };
  app = await TestApp.start({ environment, now: '2026-02-02T13:00:00Z' });
  people = await makeSmallNetwork(app);
  const token = people.office;
  await app.call('put', '/api/branches/AAA/jobs/a', { token, body: validJob() });
  app.kit.outbox.start();
  await new DigestRuns(app.kit, pino({ level: 'silent' })).check();
  await until(() => weekMail() !== undefined, 'the mail of the week has arrived');
});
afterEach(async () => {
  await app.stop();
  await post.close();
});

async function until(true_: () => boolean, what: string): Promise<void> {
  for (let waited = 0; waited < 20_000; waited += 20) {
    if (true_()) return;
    await new Promise((resolve) => setTimeout(resolve, 20));
  }
  throw new Error(`waited in vain until ${what}`);
}

const weekMail = () => post.texts.find((text) => /^Subject: Week 5/m.test(text));
/** The address that the header names, as a mail program reads it: folded lines put together (RFC 5322, 2.2.3). */
function header(name: string): string | undefined {
  const [head = ''] = (weekMail() ?? '').split('\r\n\r\n');
  const line = head.replace(/\r\n[ \t]+/g, ' ').split('\r\n');
  return line.find((one) => one.startsWith(`${name}: `))?.slice(name.length + 2);
}
const link = () => new URL(/^<(\S+)>$/.exec(header('List-Unsubscribe') ?? '')?.[1] ?? '');
const wanted = async () =>
  (
    (await app.call('get', '/api/auth/mails', { token: people.manager })).body as {
      items: { kind: string; wanted: boolean }[];
    }
  ).items.find(({ kind }) => kind === 'monday_digest')?.wanted;

describe('A digest sent through a mail server', () => {
  it('has a text and a markup part, and says how one click stops it', async () => {
    expect(weekMail()).toContain('multipart/alternative');
    expect(weekMail()).toContain('Content-Type: text/plain; charset=utf-8');
    expect(weekMail()).toContain('Content-Type: text/html; charset=utf-8');
    expect(link().origin + link().pathname).toBe('https://desk.example/unsubscribe');
    expect(header('List-Unsubscribe-Post')).toBe('List-Unsubscribe=One-Click');
    const others = post.texts.filter((text) => !text.includes('List-Unsubscribe:'));
    for (const text of others) expect(text).not.toMatch(/^Subject: (Week|Your regions)/m);
    await until(() => kept().every(({ sent_at }) => sent_at !== null), 'all are noted as sent');
    // What was sent is forgotten, the link too.
    for (const mail of kept()) expect(mail).toMatchObject({ text_body: '', unsubscribe: null });
  });

  it('read, changes nothing; posted to as a mail program does, stops that mail and no other, once', async () => {
    const { search } = link();
    const told = { kind: 'monday_digest', wanted: true };
    expect((await app.call('get', `/api/mail/unsubscribe${search}`)).body).toEqual(told);
    expect(await wanted()).toBe(true);
    for (let again = 0; again < 2; again += 1) {
      const answer = await app.call('post', `/unsubscribe${search}`, {
        body: 'List-Unsubscribe=One-Click',
        headers: { 'content-type': 'application/x-www-form-urlencoded' },
      });
      expect(answer).toMatchObject({ status: 200, body: { ...told, wanted: false } });
    }
    expect(await wanted()).toBe(false);
    const trail = app.kit.store.unscoped.all<{ actor: string; detail: string }>(
      sql('audit_events').where({ action: 'person.mails' }).select('detail'),
    );
    expect(trail).toHaveLength(1);
    expect(JSON.parse(trail[0]!.detail)).toMatchObject({
      before: { monday_digest: true, new_sign_in: true },
      after: { monday_digest: false, new_sign_in: true },
      how: 'link in a mail',
    });
  });

  it('given a link that we did not sign, answers as for one of nobody', async () => {
    const signed = link().searchParams.get('token') ?? '';
    for (const token of [people.manager, `${signed}x`, signed.slice(0, -2), 'x', '']) {
      const path = `/api/mail/unsubscribe?token=${encodeURIComponent(token)}`;
      expect((await app.call('get', path)).status).toBe(404);
      expect((await app.call('post', path)).status).toBe(404);
    }
    expect((await app.call('post', '/unsubscribe')).status).toBe(422);
    expect(await wanted()).toBe(true);
  });
});

const kept = () =>
  app.kit.store.unscoped.all<{
    sent_at: string | null;
    text_body: string;
    unsubscribe: string | null;
  }>(sql('mails').select('sent_at', 'text_body', 'unsubscribe'));
