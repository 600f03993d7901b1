import { join } from 'node:path';
import { openDatabase, type Connection } from '#db/database';

/** Tables that sending a job writes to, parents first. */
const TABLES = [
  'jobs',
  'job_revisions',
  'job_facts',
  'job_products',
  'job_findings',
  'job_consumables',
  'job_extras',
];
const NETWORK = ['regions', 'branches', 'products', 'packages', 'people', 'push_keys'];

type Row = (string | number | null)[];

/** The rows that every job of a database consists of: `[statement index, values]` in the order of writing. */
export interface Replay {
  statements: string[];
  jobs: { statement: number; values: Row }[][];
  network: { table: string; columns: string[]; rows: Row[] }[];
}

/** Reads the rows of all jobs of a database, to write them again bare. */
export function recordRows(file: Connection): Replay {
  const statements: string[] = [];
  const jobs = new Map<number, { statement: number; values: Row }[]>();
  for (const table of TABLES) {
    const columns = columnsOf(file, table);
    const statement = statements.push(insertText(table, columns)) - 1;
    const key = columns.indexOf(table === 'jobs' ? 'id' : 'job_id');
    for (const values of file.driver.prepare(`select * from ${table}`).raw().all() as Row[]) {
      const id = Number(values[key]);
      const rows = jobs.get(id) ?? [];
      rows.push({ statement, values });
      jobs.set(id, rows);
    }
  }
  const network = NETWORK.map((table) => ({
    table,
    columns: columnsOf(file, table),
    rows: file.driver.prepare(`select * from ${table}`).raw().all() as Row[],
  }));
  return { statements, jobs: [...jobs.values()], network };
}

/** Writes the same rows into a fresh file of the same schema with nothing but the engine, `perCommit` jobs a durable commit; returns seconds. */
export async function writeBare(
  replay: Replay,
  folder: string,
  name: string,
  perCommit: number,
): Promise<number> {
  const bare = await openDatabase(join(folder, name));
  for (const { table, columns, rows } of replay.network) {
    const insert = bare.driver.prepare(insertText(table, columns));
    for (const row of rows) insert.run(...row);
  }
  const inserts = replay.statements.map((text) => bare.driver.prepare(text));
  const begin = bare.driver.prepare('begin immediate');
  const commit = bare.driver.prepare('commit');
  const begun = performance.now();
  for (let start = 0; start < replay.jobs.length; start += perCommit) {
    begin.run();
    for (const rows of replay.jobs.slice(start, start + perCommit)) {
      for (const { statement, values } of rows) inserts[statement]?.run(...values);
    }
    commit.run();
  }
  const seconds = (performance.now() - begun) / 1000;
  bare.close();
  return seconds;
}

function columnsOf(connection: Connection, table: string): string[] {
  return connection.driver
    .prepare(`select name from pragma_table_info(?)`)
    .pluck()
    .all(table) as string[];
}

function insertText(table: string, columns: string[]): string {
  return `insert into ${table} (${columns.join(', ')}) values (${columns.map(() => '?').join(', ')})`;
}
