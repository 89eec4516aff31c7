import knex, { type Knex } from 'knex';
import type { Config } from '../config';
import type { Logger } from '../logger';

export type Database = Knex;
export type Transaction = Knex.Transaction;

const lockWaitS = 10;
const acquireMs = 5_000;
const largestPool = 12;

/**
 * A pool on the lab's MariaDB. READ COMMITTED, because a plain read before a lock must not freeze what later
 * statements of the transaction see (protocol 3.2); JSON stays text and 64-bit numbers stay digits until mapped.
 */
export function createDatabase(settings: Config['database'], log: Logger): Database {
  // Apart, because knex's types do not know all of the driver's settings.
  const connection = {
    host: settings.host,
    port: settings.port,
    user: settings.user,
    password: settings.password,
    database: settings.name,
    charset: 'utf8mb4',
    timezone: 'Z',
    connectTimeout: acquireMs,
    jsonStrings: true,
    supportBigNumbers: true,
    bigNumberStrings: true,
  };
  return knex({
    client: 'mysql2',
    connection,
    pool: { min: 0, max: largestPool, afterCreate: prepareSession },
    acquireConnectionTimeout: acquireMs,
    // Statements in errors keep their question marks.
    compileSqlOnError: false,
    log: {
      warn: (message: unknown) => log.warn({ from: 'knex' }, String(message)),
      error: (message: unknown) => log.error({ from: 'knex' }, String(message)),
      deprecate: (message: unknown) => log.warn({ from: 'knex' }, String(message)),
      debug: () => undefined,
    },
  });
}

interface RawConnection {
  query(sql: string, done: (error: Error | null) => void): void;
}

function prepareSession(
  connection: RawConnection,
  done: (error: Error | null, connection: RawConnection) => void,
): void {
  connection.query(
    `SET SESSION tx_isolation = 'READ-COMMITTED', sql_mode = 'STRICT_ALL_TABLES,ONLY_FULL_GROUP_BY,NO_ENGINE_SUBSTITUTION',
     time_zone = '+00:00', innodb_lock_wait_timeout = ${lockWaitS}`,
    (error) => done(error, connection),
  );
}
