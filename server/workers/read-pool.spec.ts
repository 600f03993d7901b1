import { rmSync } from 'node:fs';
import { addDays } from '#shared/domain/calendar';
import { keptJob } from '../../test/support/kept-job';
import { SmallStore } from '../../test/support/small-store';
import { ReadPool } from './read-pool';

/** More than the pieces that an export makes ahead of its reader. */
const JOBS = 4000;

let small: SmallStore;
let pool: ReadPool;
beforeAll(async () => {
  small = await SmallStore.make();
  await small.store.queue.write(() => {
    for (let index = 0; index < JOBS; index += 1) {
      small.write('AAA', `j-${index}`, keptJob(addDays('2021-01-04', index % 1800), 0.4));
    }
  });
});
afterAll(() => small.close());
beforeEach(() => {
  pool = new ReadPool(small.store.file);
});
afterEach(() => pool.close());

const period = { from: '2025-01-06', to: '2025-12-28' };
const asked = { filters: {}, sort: 'completed', todayByBranch: {}, money: 'seen' } as const;
const exportJobs = () => pool.stream('jobs', small.scope('AAA'), asked);

async function readAll(chunks: AsyncIterable<string>): Promise<string[]> {
  let text = '';
  for await (const chunk of chunks) text += chunk;
  return text.trimEnd().split('\r\n');
}
/** Whether nobody holds an old state of the database: only then can the whole log be taken into it. */
const isFree = () => {
  const [{ busy }] = small.store.writing.driver.pragma('wal_checkpoint(TRUNCATE)') as [
    { busy: number },
  ];
  return busy === 0;
};
async function until(holds: () => boolean): Promise<void> {
  for (let wait = 0; wait < 200 && !holds(); wait += 1) {
    await new Promise((resolve) => setTimeout(resolve, 25));
  }
  expect(holds()).toBe(true);
}

describe('ReadPool', () => {
  it('given a question, answers within its scope what was committed before it', async () => {
    const ask = (...branches: string[]) =>
      pool.answer('overrun', small.scope(...branches), { period, filters: {}, by: 'branch' });
    const before = (await ask('AAA', 'BBB')).jobs;
    expect((await ask('BBB')).jobs).toBe(0);
    await small.putJob('BBB', 'new', keptJob('2025-06-02', 0.4));
    expect((await ask('AAA', 'BBB')).jobs).toBe(before + 1);
    expect((await ask('BBB')).scope).toEqual({ regions: ['COAST'], branches: ['BBB'] });
  });

  it('given an export, streams every row of one state, whatever is written meanwhile', async () => {
    const rows: string[] = [];
    for await (const chunk of exportJobs()) {
      rows.push(chunk);
      if (rows.length === 2) {
        await small.putJob('AAA', 'meanwhile', keptJob('2021-01-04', 0.4));
        await small.voidJob('AAA', 'j-0');
      }
    }
    const lines = rows.join('').trimEnd().split('\r\n');
    expect(lines).toHaveLength(JOBS + 1);
    expect(rows.length).toBeGreaterThan(6);
    expect(lines.filter((line) => line.startsWith('AAA,j-0,'))).toHaveLength(1);
    expect(lines.filter((line) => line.includes('meanwhile'))).toEqual([]);
    await until(isFree);
    const after = await readAll(exportJobs());
    expect(after.filter((line) => line.includes('meanwhile'))).toHaveLength(1);
    expect(after.filter((line) => line.startsWith('AAA,j-0,'))).toEqual([]);
  });

  it('given exports that nobody takes, makes no more than a few pieces and answers questions meanwhile', async () => {
    const waiting = [exportJobs(), exportJobs()];
    const answer = await pool.answer('margin', small.scope('AAA'), {
      period,
      filters: {},
      today: '2026-02-02',
    });
    expect(answer.jobs).toBeGreaterThan(0);
    for (const stream of waiting) stream.cancel();
    await until(isFree);
  });

  it('given an export that is given up half-way or before its turn, lets go of the database and serves the next', async () => {
    const streams = [exportJobs(), exportJobs(), exportJobs()];
    const [first, , queued] = streams;
    for await (const chunk of first ?? []) {
      expect(chunk).toContain('jobRef');
      break;
    }
    queued?.cancel();
    for (const stream of streams) stream.cancel();
    await until(isFree);
    expect(await readAll(exportJobs())).toHaveLength(JOBS + 1);
  });

  it('given a thread that ends half-way, throws instead of ending the export', async () => {
    const read = async () => {
      const pieces: string[] = [];
      for await (const chunk of exportJobs()) {
        pieces.push(chunk);
        if (pieces.length === 2) await pool.close();
      }
    };
    await expect(read()).rejects.toThrow();
    expect(await readAll(exportJobs())).toHaveLength(JOBS + 1);
  });

  it('given a database that is not there, fails the question and the export, and nobody else', async () => {
    const lost = new ReadPool(`${small.store.file}-gone`);
    const question = { period, filters: {}, by: 'month' } as const;
    await expect(lost.answer('overrun', small.scope('AAA'), question)).rejects.toThrow();
    await expect(readAll(lost.stream('overrun', small.scope('AAA'), question))).rejects.toThrow();
    await lost.close();
    rmSync(`${small.store.file}-gone`, { force: true });
  });
});
