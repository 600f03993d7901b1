import { HANGING_TABLES, SCOPED_TABLES, UNSCOPED_BY_DESIGN } from '#db/tables';
import { SmallStore } from '../support/small-store';

let small: SmallStore;
beforeAll(async () => (small = await SmallStore.make()));
afterAll(() => small.close());

interface Column {
  name: string;
}
interface Key {
  table: string;
}
const tables = (): string[] =>
  small.store.unscoped
    .prepare(
      `select name from sqlite_schema where type = 'table' and name not like 'sqlite_%'
        and name not like 'knex_%' order by name`,
    )
    .all()
    .map((row) => (row as { name: string }).name);
const pragma = <Row>(text: string): Row[] => small.store.writing.driver.pragma(text) as Row[];
const hasBranch = (table: string): boolean =>
  pragma<Column>(`table_info(${table})`).some(({ name }) => name === 'branch_id');
const leadsTo = (table: string): string[] =>
  pragma<Key>(`foreign_key_list(${table})`).map((key) => key.table);

describe('The live schema', () => {
  it('given any table with a branch_id, is listed as scoped or as unscoped by design', () => {
    const listed = [...SCOPED_TABLES, ...UNSCOPED_BY_DESIGN].sort();
    expect(tables().filter(hasBranch)).toEqual(listed);
  });

  it('given any table without one whose rows hang on a scoped row, is listed as hanging', () => {
    const scoped = new Set<string>(SCOPED_TABLES);
    const hanging = tables().filter(
      (table) => !hasBranch(table) && leadsTo(table).some((other) => scoped.has(other)),
    );
    expect(hanging).toEqual([...HANGING_TABLES].sort());
  });

  it('given any table in scope, has a branch on every row', () => {
    for (const table of SCOPED_TABLES) {
      const column = pragma<Column & { notnull: number }>(`table_info(${table})`).find(
        ({ name }) => name === 'branch_id',
      );
      expect([table, column?.notnull]).toEqual([table, 1]);
      expect([table, leadsTo(table)]).toEqual([table, expect.arrayContaining(['branches'])]);
    }
  });

  it('given a view, has none that could show a table past its scope', () => {
    const views = small.store.unscoped
      .prepare("select name from sqlite_schema where type = 'view'")
      .all();
    expect(views).toEqual([]);
  });
});
