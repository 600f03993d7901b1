import knexFactory from 'knex';
import { rmSync } from 'node:fs';
import { join } from 'node:path';
import { acceptClaim } from '#db/accept-claim';
import { ClaimWriter } from '#db/claim-writer';
import { openDatabase, type Connection } from '#db/database';
import { migrations } from '#db/migrations/index';
import { claimContent } from '#shared/contracts/claims';
import type { RecordedFinding } from '#shared/domain/recorded-job';
import { SIDES, ZONES } from '#shared/domain/vocabulary';
import { RECEIPT, SmallStore } from '../support/small-store';

/** Schema before what lies underneath was kept in rows. */
const OLDER = 2;
/** Filled by the migration, or moved by it. */
const DERIVED = ['job_facts', 'job_products', 'job_findings'];

let small: SmallStore;
beforeEach(async () => (small = await SmallStore.make()));
afterEach(() => small.close());

const columnsOf = (connection: Connection, table: string): string[] =>
  connection.driver.prepare('select name from pragma_table_info(?)').pluck().all(table) as string[];

const rowsOf = (connection: Connection, table: string): unknown[] => {
  const columns = columnsOf(connection, table).sort();
  return connection.driver
    .prepare(`select ${columns.join(', ')} from ${table} order by ${columns.join(', ')}`)
    .all();
};

/** Writes the store's rows into a file of the older schema: only the columns that it knew. */
async function writeOlder(file: string, from: Connection): Promise<void> {
  const knex = knexFactory({
    client: 'better-sqlite3',
    connection: { filename: file },
    useNullAsDefault: true,
  });
  await knex.migrate.latest({
    migrationSource: {
      getMigrations: async () => migrations.slice(0, OLDER),
      getMigrationName: (migration: (typeof migrations)[number]) => migration.name,
      getMigration: async (migration: (typeof migrations)[number]) => migration,
    },
  });
  await knex.raw(
    'pragma application_id = ' + String(from.driver.pragma('application_id', { simple: true })),
  );
  await knex.raw(`pragma user_version = ${OLDER}`);
  const tables = await knex<{ name: string; type: string }>('sqlite_schema')
    .where('type', 'table')
    .select('name');
  await knex.raw('pragma foreign_keys = off');
  for (const { name } of tables) {
    if (/^(sqlite_|knex_)/.test(name)) continue;
    const known = (await knex.raw<{ name: string }[]>(`pragma table_info(${name})`)).map(
      (column) => column.name,
    );
    const rows = from.driver.prepare(`select ${known.join(', ')} from ${name}`).all() as object[];
    await knex(name)
      .delete()
      // The one row of the network is made with its table; an append-only table is empty and refuses.
      .catch(() => undefined);
    for (const row of rows) await knex(name).insert(row);
  }
  await knex.destroy();
}

/** What the migrations make of claims beside what the older schema knew. */
const claimsOf = (connection: Connection): unknown[] => [
  rowsOf(connection, 'claims'),
  rowsOf(connection, 'claim_revisions'),
];

const CLAIM = claimContent.parse({
  ...{ jobRef: 'plain', madeOn: '2026-01-30', zone: 'floor', cause: 'damage' },
  ...{ decision: 'accepted', decidedOn: '2026-01-31', costCents: 500 },
});

const FINDINGS: RecordedFinding[] = ZONES.flatMap((zone, index) =>
  SIDES.map((side, turn): RecordedFinding => {
    const seenAs = (['surface', 'bubbling', 'holed'] as const)[(index + turn) % 3]!;
    const left = (index + 2 * turn) % 4 === 0;
    return {
      ref: `${zone}/${side}/1`,
      zone,
      side,
      seenAs,
      ...(!left && { workedAs: index % 2 === 0 ? 'holed' : seenAs }),
      structural: index % 2 === 0,
      action: left ? 'deferred' : 'treated',
    };
  }),
);

describe('A data folder of the older schema', () => {
  it('given jobs of every kind, opens with the rows that the jobs would be given today', async () => {
    await small.putJob('AAA', 'plain');
    await small.putJob('AAA', 'none', { products: [], invoice: undefined } as never);
    await small.putJob('BBB', 'rotten', {
      findings: FINDINGS,
      vehicle: {
        key: 'K-1',
        make: 'Vela',
        model: 'Ono',
        bodyType: 'van',
        firstRegistered: '2009-03',
      },
      workshop: { temperatureC: 7.5 },
      boughtInCents: 1234,
      products: [
        { product: 'CW1', ml: 1000 },
        { product: 'UW1', ml: 500 },
        { product: 'CW1', ml: 250 },
      ],
    } as never);
    for (const [index, finding] of FINDINGS.entries()) {
      await small.putJob('CCC', `one-${index}`, {
        findings: [finding],
        package: 'cavity',
      } as never);
    }
    await small.putJob('CCC', 'void', { findings: FINDINGS } as never);
    await small.voidJob('CCC', 'void');
    await small.change({ kind: 'hourlyCost', code: 'AAA', from: '2026-01-01', value: 4100 });

    const file = join(small.folder, 'older.sqlite');
    await writeOlder(file, small.store.writing);
    const opened = await openDatabase(file);
    try {
      for (const table of DERIVED) {
        expect(rowsOf(opened, table).length).toBeGreaterThan(0);
        expect([table, rowsOf(opened, table)]).toEqual([table, rowsOf(small.store.writing, table)]);
      }
      expect(opened.driver.pragma('foreign_key_check')).toEqual([]);
    } finally {
      opened.close();
      rmSync(file, { force: true });
    }
  });

  it('given claims proposed and decided, opens with what counted from each revision on', async () => {
    await small.putJob('AAA', 'plain');
    const writer = new ClaimWriter(small.store, small.branch('AAA'));
    const sending = { ...RECEIPT, limitCents: 100 };
    await small.store.queue.write(() => {
      for (const role of ['site_manager', 'head_office', 'recorder'] as const) {
        const labourMinutes = role === 'recorder' ? 5 : 0;
        acceptClaim(writer, 'Ä 1', { ...CLAIM, labourMinutes }, { ...sending, role });
      }
      acceptClaim(writer, 'waits', CLAIM, { ...sending, role: 'site_manager' });
    });
    const file = join(small.folder, 'older.sqlite');
    await writeOlder(file, small.store.writing);
    const opened = await openDatabase(file);
    try {
      expect(claimsOf(opened)).toEqual(claimsOf(small.store.writing));
      const counted = 'select decision, proposed_decision from claim_revisions order by id';
      expect(opened.driver.prepare(counted).raw().all()).toEqual([
        ['open', 'accepted'],
        ['accepted', null],
        ['accepted', null],
        ['open', 'accepted'],
      ]);
      expect(() => opened.driver.exec(`update claim_revisions set content = ''`)).toThrow(
        /append-only/,
      );
    } finally {
      opened.close();
      rmSync(file, { force: true });
    }
  });
});
