import { readFileSync } from 'node:fs';
import { createServer } from 'node:http';
import { join } from 'node:path';
import pino from 'pino';
import { DatabaseRefused } from '#db/database';
import { Store } from '#db/store';
import { createApp } from './app';
import { fixedClock, realClock } from './clock';
import { ConfigRefused, readConfig } from './config';
import { importDeskOf } from './import-desk-of';
import type { Kit } from './kit';
import { LiveFeed } from './live/live-feed';
import { Outbox } from './mail/outbox';
import { DigestRuns } from './schedule/digest-runs';
import { ReportSchedule } from './schedule/report-schedule';
import { SignalLooks } from './schedule/signal-looks';
import { photoStoreOf } from './storage/photo-store';
import { PasswordThread } from './workers/password-thread';
import { ReadPool } from './workers/read-pool';
import { readSecret } from './auth/secret';
import { listenOn, PortRefused } from './listen';
import { offerDemo } from './offer-demo';

/** The project's folder: this file runs from it as source and from `dist/` when built. */
const ROOT = __dirname.endsWith(join('dist', 'server'))
  ? join(__dirname, '..', '..')
  : join(__dirname, '..');

async function main(): Promise<void> {
  const config = readConfig(process.env);
  const log = pino({ level: process.env['LOG_LEVEL'] ?? 'info' });
  const { version } = JSON.parse(readFileSync(join(ROOT, 'package.json'), 'utf8')) as {
    version: string;
  };
  const clock = config.now ? fixedClock(config.now) : realClock;
  // The port first: a second server on the same folder must not even open the database.
  const server = createServer();
  await listenOn(server, config.port);
  const store = await Store.open(config.data);
  readSecret(config);
  const outbox = new Outbox(store, config, log);
  const kit: Kit = {
    store,
    clock,
    config,
    reads: new ReadPool(store.file),
    passwords: new PasswordThread(),
    outbox,
    photos: photoStoreOf(config),
    imports: importDeskOf(store, config, clock, outbox),
    live: new LiveFeed(store),
    version,
  };
  const seeded = await offerDemo(kit);
  const app = createApp(kit, log, join(ROOT, 'dist', 'dashboard'));
  await kit.imports.start();
  server.on('request', app.express);
  kit.outbox.start();
  const schedule = new ReportSchedule(kit, log);
  schedule.start();
  const digests = new DigestRuns(kit, log);
  const looks = new SignalLooks(kit, log, digests);
  looks.start();
  digests.start();
  const address = server.address();
  const port = typeof address === 'object' && address ? address.port : config.port;
  process.stdout.write(`\nUnderseam ${version} serves http://localhost:${port}\n${seeded}\n`);

  const stop = (): void => {
    server.close();
    kit.live.close();
    server.closeAllConnections();
    schedule.close();
    looks.close();
    digests.close();
    void Promise.all([
      kit.imports.close(),
      kit.reads.close(),
      kit.passwords.close(),
      kit.outbox.close(),
    ]).then(() => {
      store.close();
      process.exit(0);
    });
  };
  process.once('SIGINT', stop);
  process.once('SIGTERM', stop);
}

main().catch((error: unknown) => {
  const known =
    error instanceof ConfigRefused ||
    error instanceof DatabaseRefused ||
    error instanceof PortRefused;
  process.stderr.write(
    known
      ? `${error.message}\n`
      : `Underseam could not start: ${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`,
  );
  process.exit(1);
});
