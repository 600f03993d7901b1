import { cpSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { serve, type Served } from '../bench/serve';

/** The instant that the demo takes as now: a Monday, 07:30 in most branches, 08:30 in the uplands. */
export const MONDAY_MORNING = '2026-02-02T06:30:00Z';
/** Today in every branch at that instant. */
export const TODAY = '2026-02-02';
/** The last week that is over: its Monday and its Sunday. */
export const LAST_WEEK = { week: '2026-W05', from: '2026-01-26', to: '2026-02-01' };

/** A demo network being served: where to, and from which data folder. */
export interface Demo {
  url: string;
  data: string;
}

/** Names the file through which the one who started the demo tells the specs where it is. */
const HANDOVER = 'UNDERSEAM_JOURNEYS';

/** Seeds a fresh folder under the system's own for temporary files, serves it, and leaves word for `servedDemo`. */
export function serveDemo(): Promise<Served> {
  return serveDemos(1);
}

/**
 * Serves so many equal demos, each from a data folder of its own, so that journeys side by side do not see what others change.
 * Seeded once and copied.
 */
export async function serveDemos(count: number): Promise<Served> {
  const folder = mkdtempSync(path.join(tmpdir(), 'underseam-journeys-'));
  const folders = Array.from({ length: count }, (_, n) => path.join(folder, `data-${n}`));
  const served: Served[] = [];
  const stop = async (): Promise<void> => {
    await Promise.all(served.map((each) => each.stop()));
    rmSync(folder, { recursive: true, force: true });
  };
  try {
    if (count > 1) await seedAll(folders);
    for (const data of folders) served.push(await serveFrom(data));
  } catch (error) {
    await stop();
    throw error;
  }
  const file = path.join(folder, 'served.json');
  const demos = served.map(({ url }, n): Demo => ({ url, data: folders[n]! }));
  writeFileSync(file, JSON.stringify(demos));
  process.env[HANDOVER] = file;
  const ended = (): void => void stop();
  process.once('exit', ended);
  return {
    url: demos[0]!.url,
    stop: async () => {
      process.off('exit', ended);
      await stop();
    },
  };
}

function serveFrom(data: string): Promise<Served> {
  mkdirSync(data, { recursive: true });
  return serve(data, { UNDERSEAM_DEMO: 'on', UNDERSEAM_NOW: MONDAY_MORNING });
}

async function seedAll([first, ...others]: readonly string[]): Promise<void> {
  const seeding = await serveFrom(first!);
  await seeding.stop();
  for (const other of others) cpSync(first!, other, { recursive: true });
}

/** The demo that serves this worker's journeys. */
export function servedDemo(): Demo {
  const file = process.env[HANDOVER];
  if (!file) throw new Error('Run the journeys with their own configuration: it serves the demo.');
  const demos = JSON.parse(readFileSync(file, 'utf8')) as Demo[];
  return demos[(Number(process.env['JEST_WORKER_ID'] ?? 1) - 1) % demos.length]!;
}
