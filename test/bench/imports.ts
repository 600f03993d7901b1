import { createReadStream, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { parse } from 'csv-parse';
import { openReader } from '#db/database';
import { Store } from '#db/store';
import type { ImportedFile } from '#shared/contracts/imports';
import { jobRows } from '../support/job-rows';
import { addOffice, get, signInOffice, timed } from './ask';
import { setUpBench } from './bench-network';
import { recordRows, writeBare } from './raw-replay';
import { ratioLine, type Line } from './report';
import { serve, type Served } from './serve';

/** Jobs that the server below takes into one commit while it writes a file. */
const ROWS_A_COMMIT = 25;
/** Milliseconds between two of the small requests that are asked meanwhile. */
const PAUSE = 40;

/**
 * A file of so many new jobs, sent, checked and written through the API: its pace against bare parsing and the bare engine's commits
 * of as many jobs, how long small requests wait meanwhile against before, and the server's memory.
 */
export async function benchImports(folder: string, rows: number, today: string): Promise<Line[]> {
  const data = join(folder, 'imports');
  const store = await Store.open(data);
  await setUpBench(store, 4);
  store.close();
  await addOffice(data);
  const served = await serve(data, { UNDERSEAM_NOW: `${today}T12:00:00Z` });
  const token = await signInOffice(served.url);
  const content = jobRows(rows, 'bench');
  const file = join(folder, 'imports.csv');
  writeFileSync(file, content);

  const before = await waits(served, token, pause(5_000));
  const memory = residentMb(served);
  const check = await during(served, token, async () => {
    const sent = await sendBenchFile(served, token, content);
    return ended(served, token, sent.id);
  });
  const id = check.result.id;
  if (check.result.counts.new !== rows) throw new Error(JSON.stringify(check.result.counts));
  const write = await during(served, token, async () => {
    await post(served, token, `/api/branches/B000/imports/${id}/confirm`);
    return ended(served, token, id);
  });
  if (write.result.written.created !== rows) throw new Error(JSON.stringify(write.result.written));
  const peak = peakMb(served);
  await served.stop();

  const reader = openReader(join(data, 'underseam.sqlite'));
  const replay = recordRows(reader);
  reader.close();
  const bare = await writeBare(replay, folder, 'bare-import.sqlite', ROWS_A_COMMIT);
  const parsing = await parseOnly(file);
  const what = `a file of ${rows} new jobs:`;
  const told = 'told, no aim';
  return [
    ratioLine(`${what} check, s`, check.seconds, 'parsing the file and no more, s', parsing, told),
    ratioLine(
      `${what} write, jobs a second`,
      rows / write.seconds,
      `bare engine, ${ROWS_A_COMMIT} jobs a commit`,
      rows / bare,
      told,
    ),
    ...(['p50', 'p99', 'max'] as const).flatMap((which) => [
      ratioLine(
        `${what} a list of jobs while checked, ${which} ms`,
        check.waits[which],
        'before',
        before[which],
        told,
      ),
      ratioLine(
        `${what} a list of jobs while written, ${which} ms`,
        write.waits[which],
        'before',
        before[which],
        told,
      ),
    ]),
    ratioLine(`${what} the server's memory at its peak, MB`, peak, 'before', memory, told),
  ];
}

interface Waits {
  p50: number;
  p99: number;
  max: number;
}

/** How long small requests wait while some work is done, and the work's own result and seconds. */
async function during<T>(
  served: Served,
  token: string,
  work: () => Promise<T>,
): Promise<{ result: T; seconds: number; waits: Waits }> {
  const begun = performance.now();
  const doing = work();
  const waiting = waits(served, token, doing);
  const result = await doing;
  const seconds = (performance.now() - begun) / 1000;
  return { result, seconds, waits: await waiting };
}

/** Asks for a list of jobs again and again until something ends, one request after another; milliseconds of each. */
async function waits(served: Served, token: string, until: Promise<unknown>): Promise<Waits> {
  const ended = new AbortController();
  const end = (): void => ended.abort();
  void until.then(end, end);
  const taken: number[] = [];
  while (!ended.signal.aborted) {
    taken.push(await timed(() => get(`${served.url}/api/jobs?limit=20`, token)));
    await pause(PAUSE);
  }
  taken.sort((a, b) => a - b);
  const at = (share: number): number => taken[Math.floor(share * (taken.length - 1))] ?? Number.NaN;
  return { p50: at(0.5), p99: at(0.99), max: at(1) };
}

async function sendBenchFile(
  { url }: Served,
  token: string,
  content: string,
): Promise<ImportedFile> {
  const form = new FormData();
  form.set('file', new Blob([content], { type: 'text/csv' }), 'bench.csv');
  const answer = await fetch(`${url}/api/branches/B000/jobs/file`, {
    method: 'POST',
    headers: { authorization: `Bearer ${token}` },
    body: form,
  });
  if (answer.status !== 201) throw new Error(await answer.text());
  return (await answer.json()) as ImportedFile;
}

async function post({ url }: Served, token: string, path: string): Promise<void> {
  const headers = { authorization: `Bearer ${token}` };
  const answer = await fetch(url + path, { method: 'POST', headers });
  if (answer.status !== 202) throw new Error(await answer.text());
}

/** The file once nothing works on it any more. */
async function ended({ url }: Served, token: string, id: string): Promise<ImportedFile> {
  for (;;) {
    const file = JSON.parse(
      await get(`${url}/api/branches/B000/imports/${id}`, token),
    ) as ImportedFile;
    if (file.state !== 'checking' && file.state !== 'writing') return file;
    await pause(250);
  }
}

/** Seconds that reading the file's cells takes, with nothing done to them. */
async function parseOnly(file: string): Promise<number> {
  const milliseconds = await timed(async () => {
    let cells = 0;
    for await (const row of createReadStream(file).pipe(parse()))
      cells += (row as unknown[]).length;
    if (cells === 0) throw new Error('the file has no cells');
  });
  return milliseconds / 1000;
}

const pause = (milliseconds: number): Promise<void> =>
  new Promise((resolve) => setTimeout(resolve, milliseconds));

/** Memory of the server's process, in megabytes, as Linux tells it; `NaN` elsewhere. */
const residentMb = (served: Served): number => statusMb(served, 'VmRSS');
const peakMb = (served: Served): number => statusMb(served, 'VmHWM');

function statusMb({ pid }: Served, line: string): number {
  if (process.platform !== 'linux') return Number.NaN;
  const found = new RegExp(`^${line}:\\s+(\\d+) kB`, 'm').exec(
    readFileSync(`/proc/${pid}/status`, 'utf8'),
  );
  return Number(found?.[1]) / 1024;
}
