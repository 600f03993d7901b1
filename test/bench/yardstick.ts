import { DuckDBInstance, type DuckDBConnection } from '@duckdb/node-api';
import type { Connection } from '#db/database';

/** Columns that the yardstick's questions are about; every value as the product's own row holds it. */
const TABLES = {
  job_facts: {
    job_id: 'integer',
    branch_id: 'integer',
    completed_on: 'date',
    week: 'varchar',
    age_band: 'tinyint',
    has_estimate: 'tinyint',
    est_minutes: 'integer',
    model_key: 'varchar',
    body_type: 'varchar',
    package_id: 'integer',
    has_rot: 'tinyint',
    bubbles_worked: 'integer',
    bubbles_holed: 'integer',
    norm_ml: 'integer',
    normed_ml: 'integer',
    act_minutes: 'integer',
    act_strip: 'integer',
    act_clean: 'integer',
    act_dry: 'integer',
    act_repair: 'integer',
    act_mask: 'integer',
    act_apply: 'integer',
    act_refit: 'integer',
    temperature_c: 'double',
  },
  job_products: {
    job_id: 'integer',
    branch_id: 'integer',
    completed_on: 'date',
    product_id: 'integer',
    package_id: 'integer',
    body_type: 'varchar',
    ml: 'integer',
    cost_cents: 'integer',
  },
  job_findings: {
    job_id: 'integer',
    branch_id: 'integer',
    ref: 'varchar',
    completed_on: 'date',
    zone: 'varchar',
    side: 'varchar',
    seen_as: 'varchar',
    worked_as: 'varchar',
    structural: 'tinyint',
    action: 'varchar',
  },
} as const;

/** The outside yardstick: an embedded columnar engine in memory with the same rows. */
export class Yardstick {
  private constructor(private readonly connection: DuckDBConnection) {}

  /** Reads the rows of an open database over. */
  static async of(rows: Connection): Promise<Yardstick> {
    const instance = await DuckDBInstance.create(':memory:', { threads: '2' });
    const connection = await instance.connect();
    for (const [table, columns] of Object.entries(TABLES)) {
      const names = Object.keys(columns);
      const types = Object.entries(columns).map(
        ([name, type]) =>
          // Dates arrive as text and become dates once all are there.
          `${name} ${type === 'date' ? 'varchar' : type}`,
      );
      await connection.run(`create table raw_${table} (${types.join(', ')})`);
      const appender = await connection.createAppender(`raw_${table}`);
      for (const row of rows.driver
        .prepare(`select ${names.join(', ')} from ${table}`)
        .raw()
        .iterate()) {
        for (const value of row as (string | number | null)[]) {
          if (value === null) appender.appendNull();
          else if (typeof value === 'string') appender.appendVarchar(value);
          else appender.appendDouble(value);
        }
        appender.endRow();
      }
      appender.closeSync();
      const chosen = Object.entries(columns).map(([name, type]) =>
        type === 'date' ? `cast(${name} as date) as ${name}` : name,
      );
      await connection.run(
        `create table ${table} as select ${chosen.join(', ')} from raw_${table}`,
      );
      await connection.run(`drop table raw_${table}`);
    }
    return new Yardstick(connection);
  }

  /** Runs some questions one after another; every row is fetched. */
  async ask(...questions: string[]): Promise<void> {
    for (const question of questions) {
      (await this.connection.runAndReadAll(question)).getRows();
    }
  }

  close(): void {
    this.connection.closeSync();
  }
}
