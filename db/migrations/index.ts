import type { Knex } from 'knex';
import * as network from './0001-network';
import * as jobs from './0002-jobs';
import * as underneath from './0003-underneath';
import * as jobsByHand from './0004-jobs-by-hand';
import * as warranty from './0005-warranty';
import * as branches from './0006-branches';

interface Migration {
  name: string;
  up: (knex: Knex) => Promise<void>;
  down: () => Promise<void>;
}

/** All migrations, oldest first; a landed one is never edited. The database's `user_version` is how many it has. */
export const migrations: readonly Migration[] = [
  { name: '0001-network', ...network },
  { name: '0002-jobs', ...jobs },
  { name: '0003-underneath', ...underneath },
  { name: '0004-jobs-by-hand', ...jobsByHand },
  { name: '0005-warranty', ...warranty },
  { name: '0006-branches', ...branches },
];

/** Hands the list to knex without reading a folder, so that it is the same from source, tests and the built server. */
export const migrationSource: Knex.MigrationSource<Migration> = {
  getMigrations: async () => [...migrations],
  getMigrationName: (migration) => migration.name,
  getMigration: async (migration) => migration,
};
