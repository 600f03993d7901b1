import { mkdtempSync, rmSync } from 'node:fs';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import pino from 'pino';
import { SMTPServer } from 'smtp-server';
import { sql } from '#db/database';
import { Store } from '#db/store';
import { Outbox } from '#server/mail/outbox';
import { realClock } from '#server/clock';
import { TestApp } from '../support/app';

const QUICK = { firstRetryMs: 40, longestRetryMs: 200, giveUpAfterMs: 60_000 };
const log = pino({ level: 'silent' });

interface Received {
  from: string;
  to: string[];
  text: string;
}

/** A real SMTP server on loopback that answers as the test says. */
class PostOffice {
  readonly received: Received[] = [];
  /** Recipients refused so far, with the code to refuse with. */
  readonly refusals: number[] = [];
  refuseWith: number | undefined;
  private readonly server: SMTPServer;

  constructor() {
    this.server = new SMTPServer({
      disabledCommands: ['AUTH', 'STARTTLS'],
      closeTimeout: 100,
      onRcptTo: (_address, _session, done) => {
        if (this.refuseWith === undefined) {
          done();
          return;
        }
        this.refusals.push(this.refuseWith);
        done(Object.assign(new Error('no such luck'), { responseCode: this.refuseWith }));
      },
      onData: (stream, session, done) => {
        const pieces: Buffer[] = [];
        stream.on('data', (piece: Buffer) => pieces.push(piece));
        stream.on('end', () => {
          const from = session.envelope.mailFrom;
          this.received.push({
            from: from === false ? '' : from.address,
            to: session.envelope.rcptTo.map(({ address }) => address),
            text: Buffer.concat(pieces).toString('utf8'),
          });
          done();
        });
      },
    });
  }

  async open(port = 0): Promise<number> {
    await new Promise<void>((resolve) => this.server.listen(port, '127.0.0.1', resolve));
    return (this.server.server.address() as AddressInfo).port;
  }

  close(): Promise<void> {
    return new Promise((resolve) => this.server.close(() => resolve()));
  }
}

async function until(true_: () => boolean, what: string): Promise<void> {
  for (let waited = 0; waited < 10_000; waited += 20) {
    if (true_()) return;
    await new Promise((resolve) => setTimeout(resolve, 20));
  }
  throw new Error(`waited in vain until ${what}`);
}

/** A quoted-printable body as text (RFC 2045, 6.7). */
const unquoted = (text: string): string =>
  text
    .replace(/=\r?\n/g, '')
    .replace(/=([0-9A-F]{2})/g, (_all, hex: string) =>
      String.fromCharCode(Number.parseInt(hex, 16)),
    );

const rows = (store: Store) =>
  store.unscoped.all<{
    sent_at: string | null;
    attempts: number;
    text_body: string;
    html_body: string | null;
    next_attempt_at: string | null;
    last_error: string | null;
  }>(sql('mails').orderBy('id'));

describe('Outbox', () => {
  let post: PostOffice;
  let folder: string;
  let store: Store;
  let outbox: Outbox | undefined;

  beforeEach(async () => {
    post = new PostOffice();
    folder = mkdtempSync(join(tmpdir(), 'underseam-mail-'));
    store = await Store.open(folder);
  });
  afterEach(async () => {
    await outbox?.close();
    outbox = undefined;
    await post.close();
    store.close();
    rmSync(folder, { recursive: true, force: true });
  });

  const make = (port: number, pace = QUICK): Outbox => {
    const smtpUrl = `smtp://127.0.0.1:${port}`;
    outbox = new Outbox(
      store,
      { smtpUrl, publicUrl: 'https://desk.example' },
      log,
      realClock,
      pace,
    );
    return outbox;
  };
  const queue = (name = 'Ansa', email = 'ansa@network.example') =>
    store.queue.write(() => outbox!.queueInvitation({ email, name }, 'abc123'));

  it('given a server, sends text and html once, and forgets what it sent', async () => {
    make(await post.open()).start();
    await queue();
    await until(() => rows(store)[0]?.sent_at != null, 'the mail is noted as sent');
    expect(post.received).toHaveLength(1);
    const [mail] = post.received;
    expect(mail).toMatchObject({ from: 'underseam@desk.example', to: ['ansa@network.example'] });
    const text = unquoted(mail!.text);
    expect(text).toContain('Subject: Your sign-in for Underseam');
    expect(text).toContain('multipart/alternative');
    expect(text).toContain('Auto-Submitted: auto-generated');
    expect(text).toContain('\nhttps://desk.example/welcome?token=abc123&purpose=invitation');
    expect(text).toContain(
      'href="https://desk.example/welcome?token=abc123&amp;purpose=invitation"',
    );
    expect(rows(store)[0]).toMatchObject({
      attempts: 1,
      text_body: '',
      html_body: null,
      next_attempt_at: null,
    });
    await queue();
    await until(() => rows(store)[1]?.sent_at != null, 'a later mail is sent too');
    expect(post.received).toHaveLength(2);
  });

  it('when the write it belongs to fails, sends nothing', async () => {
    make(await post.open()).start();
    const failed = store.queue.write(() => {
      outbox!.queueReset({ email: 'ansa@network.example', name: 'Ansa' }, 'abc123');
      throw new Error('the rest of the write fails');
    });
    await expect(failed).rejects.toThrow();
    await queue();
    await until(() => post.received.length > 0, 'the other mail arrives');
    expect(rows(store)).toHaveLength(1);
    expect(post.received[0]!.text).toContain('Your sign-in');
  });

  it('when the server is away, tries again until it is back, under one Message-ID', async () => {
    const port = await post.open();
    post.refuseWith = 451;
    make(port).start();
    await queue();
    await until(() => post.refusals.length >= 3, 'it has been tried three times');
    expect(rows(store)[0]).toMatchObject({ sent_at: null, last_error: 'EENVELOPE 451' });
    post.refuseWith = undefined;
    await until(() => post.received.length === 1, 'the mail arrives');
    await until(() => rows(store)[0]?.sent_at != null, 'it is noted');
    expect(post.received[0]!.text).toMatch(/Message-ID: <1\.\d+@desk\.example>/i);
  });

  it('when nothing listens, keeps the mail and waits longer each time', async () => {
    const port = await post.open();
    await post.close();
    make(port, { ...QUICK, longestRetryMs: 60_000 }).start();
    await queue();
    await until(() => (rows(store)[0]?.attempts ?? 0) >= 4, 'it has been tried four times');
    await outbox!.close();
    const [mail] = rows(store);
    expect(mail!.last_error).toBe('ESOCKET');
    const wait = Date.parse(mail!.next_attempt_at!) - Date.now();
    expect(wait).toBeGreaterThan(0);
    expect(wait).toBeLessThanOrEqual(QUICK.firstRetryMs * 2 ** (mail!.attempts - 1));
  });

  it('when the recipient is refused for good, gives up and keeps no text', async () => {
    const port = await post.open();
    post.refuseWith = 550;
    make(port).start();
    await queue();
    await until(() => rows(store)[0]?.last_error != null, 'it is noted');
    expect(rows(store)[0]).toMatchObject({
      sent_at: null,
      next_attempt_at: null,
      attempts: 1,
      text_body: '',
      last_error: 'EENVELOPE 550',
    });
    await new Promise((resolve) => setTimeout(resolve, 5 * QUICK.firstRetryMs));
    expect(post.refusals).toHaveLength(1);
  });

  it('when a mail has become too old, gives up', async () => {
    const port = await post.open();
    post.refuseWith = 451;
    make(port, { ...QUICK, giveUpAfterMs: 600 }).start();
    await queue();
    await until(() => rows(store)[0]?.next_attempt_at === null, 'it is given up');
    expect(rows(store)[0]!.attempts).toBeGreaterThan(1);
    expect(rows(store)[0]!.sent_at).toBeNull();
  });

  it('after a restart, sends what was waiting', async () => {
    const port = await post.open();
    make(port);
    await queue();
    await outbox!.close();
    expect(post.received).toHaveLength(0);
    make(port).start();
    await until(() => rows(store)[0]?.sent_at != null, 'it is sent');
    expect(post.received).toHaveLength(1);
  });

  it('given names that would write headers or markup, sends them as plain text', async () => {
    make(await post.open()).start();
    await queue('Eve\r\nBcc: all@network.example\u2028\u202e<script>alert("x")</script> Žlůť 🚗');
    await until(() => post.received.length === 1, 'the mail arrives');
    const [mail] = post.received;
    expect(mail!.to).toEqual(['ansa@network.example']);
    const headers = mail!.text.split('\r\n\r\n')[0]!;
    // A header of that name; the three letters may be in a boundary's random ones.
    expect(headers).not.toMatch(/^bcc\s*:/im);
    const bytes = Buffer.from(unquoted(mail!.text), 'latin1').toString('utf8');
    expect(bytes).toContain(
      'Hello Eve Bcc: all@network.example <script>alert("x")</script> Žlůť 🚗,',
    );
    expect(bytes).toContain('&lt;script&gt;alert(&quot;x&quot;)&lt;/script&gt; Žlůť 🚗,</p>');
  });

  it('given a recipient that would add another, reaches nobody else', async () => {
    make(await post.open()).start();
    await queue('Eve', 'eve@network.example\r\nRCPT TO:<all@network.example>');
    await queue('Eve', 'eve@network.example, all@network.example');
    await queue();
    await until(
      () => post.received.some(({ to }) => to.includes('ansa@network.example')),
      'the good one arrives',
    );
    expect(post.received.flatMap(({ to }) => to)).not.toContain('all@network.example');
  });

  it('without a server, keeps the mail to be read here and sends nothing', async () => {
    outbox = new Outbox(store, { smtpUrl: undefined, publicUrl: 'http://localhost:1' }, log);
    outbox.start();
    await queue();
    expect(rows(store)[0]).toMatchObject({ attempts: 0, next_attempt_at: null, sent_at: null });
    expect(rows(store)[0]!.text_body).toContain('http://localhost:1/welcome?token=abc123');
  });
});

describe('a mail asked for through the API', () => {
  it('with SMTP_URL set, arrives, and its link sets the password', async () => {
    const post = new PostOffice();
    const port = await post.open();
    const app = await TestApp.start({ environment: { SMTP_URL: `smtp://127.0.0.1:${port}` } });
    try {
      app.kit.outbox.start();
      await app.signIn('office@network.example', 'head_office');
      const body = { email: 'office@network.example' };
      expect((await app.call('post', '/api/auth/reset-request', { body })).status).toBe(204);
      await until(() => post.received.length === 1, 'the mail arrives');
      const token = /token=([0-9a-f]{64})&purpose=reset/.exec(
        unquoted(post.received[0]!.text).replace('token=3D', 'token='),
      )?.[1];
      const set = await app.call('post', '/api/auth/set-password', {
        body: { token, newPassword: 'another long password' },
      });
      expect(set.status).toBe(204);
    } finally {
      await app.stop();
      await post.close();
    }
  });
});
