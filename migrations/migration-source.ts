import type { Knex } from 'knex';
import * as labsAndAccounts from './20261201101524_create_labs_and_accounts';
import * as book from './20261201101625_create_book';
import * as readings from './20261201101725_create_readings';

interface Migration {
  readonly name: string;
  readonly up: (knex: Knex) => Promise<void>;
  readonly down: (knex: Knex) => Promise<void>;
}

/** In order. Names carry no extension, so that a bundle and the sources agree on what has run. */
const migrations: readonly Migration[] = [
  { name: '20261201101524_create_labs_and_accounts', ...labsAndAccounts },
  { name: '20261201101625_create_book', ...book },
  { name: '20261201101725_create_readings', ...readings },
];

export const migrationSource: Knex.MigrationSource<Migration> = {
  getMigrations: () => Promise.resolve([...migrations]),
  getMigrationName: (migration) => migration.name,
  getMigration: (migration) => Promise.resolve({ up: migration.up, down: migration.down }),
};
