import type { Connection, Query } from './database';

/**
 * Reads and writes of what belongs to the whole network: set-up, people, sign-ins, mails, the audit trail. Not handed to a
 * request that works on branches' rows; lint names the few places that may import it. Writes run inside `WriteQueue.write`.
 */
export class UnscopedDb {
  constructor(private readonly connection: Connection) {}

  all<Row>(query: Query): Row[] {
    return this.connection.all<Row>(query);
  }

  first<Row>(query: Query): Row | undefined {
    return this.connection.first<Row>(query);
  }

  run(query: Query): { changes: number; id: number } {
    return this.connection.run(query);
  }

  /** A prepared statement for a hot path. */
  prepare(text: string): ReturnType<Connection['prepare']> {
    return this.connection.prepare(text);
  }
}
