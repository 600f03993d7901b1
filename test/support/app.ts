import { mkdtempSync, rmSync } from 'node:fs';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import pino from 'pino';
import type { Endpoint } from '#shared/contracts/endpoint';
import type { Role } from '#shared/domain/vocabulary';
import { sql } from '#db/database';
import { Store } from '#db/store';
import { createApp } from '#server/app';
import { fixedClock } from '#server/clock';
import { readConfig } from '#server/config';
import type { Kit } from '#server/kit';
import { importDeskOf } from '#server/import-desk-of';
import { LiveFeed, type Paces } from '#server/live/live-feed';
import { Outbox } from '#server/mail/outbox';
import { photoStoreOf } from '#server/storage/photo-store';
import { PasswordThread } from '#server/workers/password-thread';
import { ReadPool } from '#server/workers/read-pool';
import { readAnswer } from './read-answer';

export const PASSWORD = 'long enough to be safe';
/** Hashing cost of the tests: the real one takes a quarter of a second each. */
const CHEAP = 4;

/** What a call answered. */
export interface Answer {
  status: number;
  headers: Headers;
  text: string;
  // eslint-disable-next-line @typescript-eslint/no-explicit-any -- tests read answers of every shape
  body: any;
}

/** A real server on a real database in a folder of its own. */
export class TestApp {
  private constructor(
    readonly kit: Kit,
    readonly url: string,
    readonly folder: string,
    readonly mounted: readonly Endpoint[],
    private readonly server: Server,
  ) {}

  /** Starts one; `now` fixes the business clock, `environment` adds settings. */
  static async start(
    options: {
      now?: string;
      environment?: NodeJS.ProcessEnv;
      folder?: string;
      /** How fast live changes leave. */
      live?: Paces;
    } = {},
  ): Promise<TestApp> {
    const folder = options.folder ?? mkdtempSync(join(tmpdir(), 'underseam-test-'));
    const config = readConfig({
      UNDERSEAM_DATA: folder,
      UNDERSEAM_DEMO: 'off',
      ...options.environment,
    });
    const log = pino({ level: process.env['TEST_LOG'] ?? 'silent' });
    const store = await Store.open(folder);
    const clock = fixedClock(new Date(options.now ?? '2026-02-02T06:30:00Z'));
    const outbox = new Outbox(store, config, log);
    const kit: Kit = {
      store,
      clock,
      config,
      reads: new ReadPool(store.file),
      passwords: new PasswordThread(CHEAP),
      outbox,
      photos: photoStoreOf(config),
      imports: importDeskOf(store, config, clock, outbox),
      live: new LiveFeed(store, options.live),
      version: '0.0.0-test',
    };
    await kit.imports.start();
    const app = createApp(kit, log, join(folder, 'no-dashboard'));
    const server = createServer(app.express);
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
    const { port } = server.address() as AddressInfo;
    return new TestApp(kit, `http://127.0.0.1:${port}`, folder, app.mounted, server);
  }

  /** Calls the API; a body is sent as JSON unless it is text already. */
  async call(
    method: string,
    path: string,
    options: { token?: string | undefined; body?: unknown; headers?: Record<string, string> } = {},
  ): Promise<Answer> {
    const { token, body, headers = {} } = options;
    const response = await fetch(this.url + path, {
      method: method.toUpperCase(),
      headers: {
        ...(token !== undefined && { authorization: `Bearer ${token}` }),
        ...(body !== undefined && { 'content-type': 'application/json' }),
        ...headers,
      },
      ...(body !== undefined && { body: typeof body === 'string' ? body : JSON.stringify(body) }),
    });
    return readAnswer(response);
  }

  /** Puts a person into the database and signs them in through the API. */
  async signIn(
    email: string,
    role: Role,
    place: { regions?: string[]; branches?: string[] } = {},
  ): Promise<string> {
    await this.addPerson(email, role, place);
    const answer = await this.call('post', '/api/auth/sign-in', {
      body: { email, password: PASSWORD },
    });
    return (answer.body as { accessToken: string }).accessToken;
  }

  private async addPerson(
    email: string,
    role: Role,
    { regions = [], branches = [] }: { regions?: string[]; branches?: string[] },
  ): Promise<void> {
    const { store, passwords } = this.kit;
    const hash = await passwords.hash(PASSWORD);
    await store.queue.write(() => {
      const db = store.unscoped;
      const { id } = db.run(
        sql('people').insert({
          email,
          email_key: email.toLowerCase(),
          name: email,
          role,
          password_hash: hash,
          created_at: '2026-01-01T00:00:00.000Z',
        }),
      );
      for (const code of branches) {
        const branch = db.first<{ id: number }>(sql('branches').where({ code }).select('id'));
        db.run(sql('person_branches').insert({ person_id: id, branch_id: branch?.id }));
      }
      for (const code of regions) {
        const region = db.first<{ id: number }>(sql('regions').where({ code }).select('id'));
        db.run(sql('person_regions').insert({ person_id: id, region_id: region?.id }));
      }
    });
  }

  /** Stops the server; the data folder goes too unless it is kept. */
  async stop(after: 'remove' | 'keep' = 'remove'): Promise<void> {
    const { kit, server } = this;
    kit.live.close();
    server.closeAllConnections();
    await new Promise((resolve) => server.close(resolve));
    await kit.imports.close();
    await Promise.all([kit.reads.close(), kit.passwords.close(), kit.outbox.close()]);
    kit.store.close();
    if (after === 'remove') rmSync(this.folder, { recursive: true, force: true });
  }
}
