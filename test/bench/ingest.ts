import { Agent, request } from 'node:http';
import { join } from 'node:path';
import { openReader, sql } from '#db/database';
import { Store } from '#db/store';
import { createHash } from 'node:crypto';
import { setUpBench } from './bench-network';
import { recordRows, writeBare } from './raw-replay';
import { ratioLine, type Line } from './report';
import { serve } from './serve';
import { jobMaker } from './synthetic-jobs';

const KEY_ID = 'be0c00000000';
const SECRET = 'be'.repeat(32);
const KEY = `usk_${KEY_ID}_${SECRET}`;
const BATCH = 500;

type Way = 'batch' | 'single';
/** Comparisons of each way; the middle one counts, since a disk's pace changes from minute to minute. */
const ROUNDS = 5;

/** Batch and single ingest through the API, against the bare engine writing the same rows with commits as durable. */
export async function benchIngest(folder: string, jobs: number, today: string): Promise<Line[]> {
  const lines: Line[] = [];
  for (const way of ['batch', 'single'] as const) {
    const rounds: Compared[] = [];
    for (let round = 0; round < ROUNDS; round += 1) {
      rounds.push(await compare(join(folder, `${way}-${round}`), way, jobs, today));
    }
    rounds.sort((a, b) => a.ours / a.theirs - b.ours / b.theirs);
    const { ours, theirs, rowsPerJob } = rounds[Math.floor(ROUNDS / 2)] as Compared;
    const [what, yardstick] =
      way === 'batch'
        ? [
            `batches of ${BATCH} at 2 connections, jobs a second`,
            `bare engine, ${BATCH} jobs a commit (${rowsPerJob.toFixed(1)} rows a job)`,
          ]
        : ['single PUTs at 16 connections, jobs a second', 'bare engine, one job a commit'];
    lines.push(ratioLine(what, ours, yardstick, theirs, 'aim at least 0.5'));
  }
  return lines;
}

interface Compared {
  ours: number;
  theirs: number;
  rowsPerJob: number;
}

/** Sends jobs through a server of its own, then writes the very same rows bare; jobs a second of both. */
async function compare(folder: string, way: Way, jobs: number, today: string): Promise<Compared> {
  await prepare(folder);
  const served = await serve(folder, { UNDERSEAM_NOW: `${today}T12:00:00Z` });
  const agent = new Agent({ keepAlive: true, maxSockets: 16 });
  const bodies = way === 'batch' ? batchBodies(jobs, today) : singleBodies(jobs, today);
  // Some first, so that neither side is measured cold.
  const warm = jobMaker(7, today, 700);
  for (let index = 0; index < 300; index += 1) {
    const { content } = warm(index);
    await send(agent, served.url, 'PUT', `/jobs/warm${index}`, JSON.stringify(content));
  }
  const begun = performance.now();
  await inParallel(bodies, way === 'batch' ? 2 : 16, ({ method, path, body }) =>
    send(agent, served.url, method, path, body),
  );
  const seconds = (performance.now() - begun) / 1000;
  agent.destroy();
  await served.stop();
  const reader = openReader(join(folder, 'underseam.sqlite'));
  const replay = recordRows(reader);
  reader.close();
  const rows = replay.jobs.reduce((all, job) => all + job.length, 0);
  const bare = await writeBare(replay, folder, 'bare.sqlite', way === 'batch' ? BATCH : 1);
  return {
    ours: jobs / seconds,
    theirs: replay.jobs.length / bare,
    rowsPerJob: rows / replay.jobs.length,
  };
}

async function prepare(data: string): Promise<void> {
  const store = await Store.open(data);
  await setUpBench(store, 4);
  await store.queue.write(() => {
    const branch = store.state.branches[0];
    store.unscoped.run(
      sql('push_keys').insert({
        id: KEY_ID,
        branch_id: branch?.id,
        label: 'bench',
        secret_hash: createHash('sha256').update(SECRET).digest('hex'),
        created_at: '2026-01-01T00:00:00.000Z',
      }),
    );
  });
  store.close();
}

interface Sending {
  method: 'PUT' | 'POST';
  path: string;
  body: string;
}

function singleBodies(jobs: number, today: string): Sending[] {
  const make = jobMaker(11, today, 700);
  return Array.from({ length: jobs }, (_, index) => {
    const { jobRef, content } = make(index);
    return { method: 'PUT', path: `/jobs/${jobRef}`, body: JSON.stringify(content) };
  });
}

function batchBodies(jobs: number, today: string): Sending[] {
  const make = jobMaker(11, today, 700);
  const bodies: Sending[] = [];
  for (let start = 0; start < jobs; start += BATCH) {
    const items = Array.from({ length: Math.min(BATCH, jobs - start) }, (_, offset) => {
      const { jobRef, content } = make(start + offset);
      return { jobRef, ...content };
    });
    bodies.push({ method: 'POST', path: '/jobs/batch', body: JSON.stringify({ jobs: items }) });
  }
  return bodies;
}

function send(
  agent: Agent,
  url: string,
  method: string,
  path: string,
  body: string,
): Promise<void> {
  return new Promise((resolve, reject) => {
    const call = request(
      `${url}/api/branches/B000${path}`,
      {
        method,
        agent,
        headers: {
          authorization: `Bearer ${KEY}`,
          'content-type': 'application/json',
          'content-length': Buffer.byteLength(body),
        },
      },
      (answer) => {
        let text = '';
        answer.setEncoding('utf8');
        answer.on('data', (chunk: string) => (text += chunk));
        answer.on('end', () => {
          if ((answer.statusCode ?? 500) < 300 && !text.includes('"rejected":1')) resolve();
          else reject(new Error(`${answer.statusCode}: ${text.slice(0, 500)}`));
        });
      },
    );
    call.on('error', reject);
    call.end(body);
  });
}

async function inParallel<T>(
  items: readonly T[],
  width: number,
  work: (item: T) => Promise<void>,
): Promise<void> {
  let next = 0;
  const lane = async (): Promise<void> => {
    for (let item = items[next++]; item !== undefined; item = items[next++]) await work(item);
  };
  await Promise.all(Array.from({ length: width }, lane));
}
