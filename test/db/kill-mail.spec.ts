import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { sql } from '#db/database';
import { insertMail } from '#db/queries/mails';
import { Store } from '#db/store';
import { PostOffice, type MailMoment } from '../support/post-office';
import { SpawnedServer } from '../support/spawned-server';

const MAILS = 12;
/** Every moment of a mail, each twice: at the server's word, and a little after it. */
const MOMENTS: readonly MailMoment[] = ['recipient', 'data', 'whole', 'answered'];

let post: PostOffice;
let port: number;
let folder: string;
beforeEach(async () => {
  post = new PostOffice();
  port = await post.open();
  folder = mkdtempSync(join(tmpdir(), 'underseam-kill-mail-'));
  const store = await Store.open(folder);
  const at = '2026-02-02T06:30:00.000Z';
  await store.queue.write(() => {
    for (let index = 0; index < MAILS; index += 1) {
      const to = `person${index}@network.example`;
      const mail = { to, subject: `Mail ${index}`, text: `Text ${index}\n`, html: '<p>Text</p>' };
      insertMail(store.unscoped, { ...mail, createdAt: at, sendAt: at });
    }
  });
  store.close();
});
afterEach(async () => {
  await SpawnedServer.killAll();
  await post.close();
  rmSync(folder, { recursive: true, force: true });
});

const start = (): SpawnedServer =>
  SpawnedServer.start({
    PORT: '0',
    UNDERSEAM_DATA: folder,
    SMTP_URL: `smtp://127.0.0.1:${port}`,
    LOG_LEVEL: 'silent',
  });
const later = (milliseconds: number): Promise<void> =>
  new Promise((resolve) => setTimeout(resolve, milliseconds));

/** Starts a server and kills it at the first such moment of a mail, or a little after it. */
async function killedAt(moment: MailMoment, afterMs: number): Promise<void> {
  const server = start();
  await new Promise<void>((resolve, reject) => {
    server.ended.then(({ stderr }) => reject(new Error(stderr)), reject);
    post.at = async (now) => {
      if (now !== moment) return;
      post.at = () => undefined;
      if (afterMs > 0) await later(afterMs);
      const ended = server.kill();
      resolve();
      // The server's answer comes when nobody is left to hear it.
      await ended;
    };
  });
  await server.kill();
  await later(50);
}

describe('A server killed while it sends mails', () => {
  it('at whatever moment of a mail, has each mail taken once and loses none', async () => {
    for (const afterMs of [0, 4]) {
      for (const moment of MOMENTS) await killedAt(moment, afterMs);
    }
    start();
    for (let wait = 0; wait < 600 && new Set(post.taken).size < MAILS; wait += 1) await later(50);
    await later(500);
    await SpawnedServer.killAll();
    expect([...post.taken].sort()).toEqual([...new Set(post.taken)].sort());
    expect(post.taken).toHaveLength(MAILS);
    const store = await Store.open(folder);
    const mails = store.unscoped.all<{ handed_over_at: string | null; last_error: string | null }>(
      sql('mails').whereNotNull('handed_over_at').select('handed_over_at', 'last_error'),
    );
    store.close();
    expect(mails).toHaveLength(MAILS);
    // Those whose answer nobody heard say so.
    expect(mails.filter(({ last_error }) => last_error !== null).length).toBeGreaterThanOrEqual(2);
  }, 240_000);
});
