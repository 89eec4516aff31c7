import type { Knex } from 'knex';
import type { Database } from './database';

/** Brings the schema to this version; answers the names of what ran. */
export async function migrateToLatest(
  database: Database,
  source: Knex.MigrationSource<unknown>,
): Promise<string[]> {
  const [, names] = (await database.migrate.latest({ migrationSource: source })) as [number, string[]];
  return names;
}
