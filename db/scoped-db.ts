import type { Knex } from 'knex';
import { assertScoped } from './assert-scoped';
import { sql, type Connection, type Query } from './database';
import type { Scope } from './scope';
import { GENERATION_TABLES, SCOPED_TABLES, type ScopedTable } from './tables';
import { VISIBLE } from './visible-rows';

const IN_SCOPE = 'in (select value from json_each(?))';

/** Statements that have been found to keep to a scope, whichever it is. */
const passed = new Set<string>();
const MOST_TEXTS = 2000;

/**
 * The only reader of branches' rows that a request gets: bound to one scope for its life. `table` gives a derived table that
 * holds the rows in scope, so that no later condition can widen it; every statement is checked before it runs.
 */
export class ScopedDb {
  constructor(
    private readonly connection: Connection,
    readonly scope: Scope,
  ) {}

  /** The rows of a table in scope (and, of derived rows, those visible now), as `select … from (…) as <alias>`. */
  table(name: ScopedTable, alias: string = name): Knex.QueryBuilder {
    return sql.from(this.derived(name, alias));
  }

  /** The same rows to join to another table of this reader. */
  derived(name: ScopedTable, alias: string = name): Knex.Raw {
    return sql.raw(`${derivedText(name)} as ??`, [this.scope.idsJson, alias]);
  }

  /** The same reader of fewer branches (rule 22). */
  narrowed(asked: { region?: readonly string[]; branch?: readonly string[] }): ScopedDb {
    return new ScopedDb(this.connection, this.scope.narrow(asked));
  }

  all<Row>(query: Query): Row[] {
    this.check(query);
    return this.connection.all<Row>(query);
  }

  first<Row>(query: Query): Row | undefined {
    this.check(query);
    return this.connection.first<Row>(query);
  }

  /** Rows one at a time; nothing else may be read through this connection meanwhile. */
  iterate<Row>(query: Query): IterableIterator<Row> {
    this.check(query);
    return this.connection.iterate<Row>(query);
  }

  /** Runs several reads on one unchanging state of the database. */
  snapshot<T>(read: () => T): T {
    if (this.connection.driver.inTransaction) return read();
    return this.connection.driver.transaction(read)();
  }

  private check(query: Query): { sql: string; bindings: readonly unknown[] } {
    const native = query.toSQL().toNative();
    if (!passed.has(native.sql)) {
      let rest = native.sql;
      for (const table of SCOPED_TABLES) rest = rest.replaceAll(derivedText(table), '(select 1)');
      assertScoped(rest);
      // Texts do not vary with scope, so they are few; what would make them many must not fill the memory.
      if (passed.size >= MOST_TEXTS) passed.clear();
      passed.add(native.sql);
    }
    return native;
  }
}

function derivedText(name: ScopedTable): string {
  const visible = GENERATION_TABLES.includes(name) ? ` and ${VISIBLE}` : '';
  return `(select * from ${name} where branch_id ${IN_SCOPE}${visible})`;
}
