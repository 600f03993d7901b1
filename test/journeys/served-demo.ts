import { mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
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
export async function serveDemo(): Promise<Served> {
  const folder = mkdtempSync(path.join(tmpdir(), 'underseam-journeys-'));
  const data = path.join(folder, 'data');
  mkdirSync(data);
  const served = await serve(data, {
    UNDERSEAM_DEMO: 'on',
    UNDERSEAM_NOW: MONDAY_MORNING,
  }).catch((error: unknown) => {
    rmSync(folder, { recursive: true, force: true });
    throw error;
  });
  const file = path.join(folder, 'served.json');
  writeFileSync(file, JSON.stringify({ url: served.url, data } satisfies Demo));
  process.env[HANDOVER] = file;
  const ended = (): void => void served.stop();
  process.once('exit', ended);
  return {
    url: served.url,
    stop: async () => {
      process.off('exit', ended);
      await served.stop();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

/** The demo that serves this run of the journeys. */
export function servedDemo(): Demo {
  const file = process.env[HANDOVER];
  if (!file) throw new Error('Run the journeys with their own configuration: it serves the demo.');
  return JSON.parse(readFileSync(file, 'utf8')) as Demo;
}
