import { randomUUID } from 'node:crypto';
import { type Connection, createConnection, type RowDataPacket } from 'mysql2/promise';
import { inject } from 'vitest';

export interface TestDatabase {
  /** In the shape that `Config['database']` has. */
  readonly settings: {
    readonly host: string;
    readonly port: number;
    readonly user: string;
    readonly password: string;
    readonly name: string;
  };
  drop(): Promise<void>;
}

/**
 * A database of this test's own: every table, key, trigger and row of the migrated base. Make one per file
 * (or per test, where a test has to begin empty) and drop it at the end.
 */
export async function createTestDatabase(): Promise<TestDatabase> {
  const { base, ...account } = inject('mariaDb');
  const name = `holdoff_test_${randomUUID().replaceAll('-', '').slice(0, 20)}`;
  await withConnection(account, async (connection) => {
    await connection.query(
      `CREATE DATABASE ${quoted(name)} CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`,
    );
    await copyDatabase(connection, base, name);
  });
  return {
    settings: { ...account, name },
    drop: () =>
      withConnection(account, async (connection) => {
        await connection.query(`DROP DATABASE IF EXISTS ${quoted(name)}`);
      }),
  };
}

/** As the account of the tests, which may do anything in databases named `holdoff_test_...`. */
export async function withConnection(
  account: { host: string; port: number; user: string; password: string },
  work: (connection: Connection) => Promise<void>,
): Promise<void> {
  const { host, port, user, password } = account;
  const connection = await createConnection({ host, port, user, password });
  try {
    await work(connection);
  } finally {
    await connection.end();
  }
}

// CREATE TABLE ... LIKE would leave the foreign keys behind.
export async function copyDatabase(connection: Connection, from: string, to: string): Promise<void> {
  await connection.query('SET FOREIGN_KEY_CHECKS = 0');
  const tables = await tablesOf(connection, from);
  const definitions = await Promise.all(
    tables.map((table) =>
      textOf(connection, `SHOW CREATE TABLE ${quoted(from)}.${quoted(table)}`, 'Create Table'),
    ),
  );
  const triggers = await triggersOf(connection, from);
  await connection.query(`USE ${quoted(to)}`);
  for (const definition of definitions) await connection.query(definition);
  for (const table of tables) {
    const columns = (await storedColumnsOf(connection, from, table)).map(quoted).join(', ');
    await connection.query(
      `INSERT INTO ${quoted(table)} (${columns}) SELECT ${columns} FROM ${quoted(from)}.${quoted(table)}`,
    );
  }
  for (const trigger of triggers) await connection.query(trigger);
}

async function tablesOf(connection: Connection, database: string): Promise<string[]> {
  const [rows] = await connection.query<RowDataPacket[]>(
    'SELECT TABLE_NAME AS name, TABLE_TYPE AS type FROM information_schema.TABLES WHERE TABLE_SCHEMA = ? ORDER BY 1',
    [database],
  );
  return rows.map((row) => {
    if (row['type'] !== 'BASE TABLE')
      throw new Error(`${String(row['name'])} is no plain table: teach the copy`);
    return String(row['name']);
  });
}

async function triggersOf(connection: Connection, database: string): Promise<string[]> {
  const [rows] = await connection.query<RowDataPacket[]>(
    'SELECT TRIGGER_NAME AS name FROM information_schema.TRIGGERS WHERE TRIGGER_SCHEMA = ? ORDER BY ACTION_ORDER, 1',
    [database],
  );
  return Promise.all(
    rows.map((row) =>
      textOf(
        connection,
        `SHOW CREATE TRIGGER ${quoted(database)}.${quoted(String(row['name']))}`,
        'SQL Original Statement',
      ),
    ),
  );
}

async function storedColumnsOf(connection: Connection, database: string, table: string): Promise<string[]> {
  const [rows] = await connection.query<RowDataPacket[]>(
    `SELECT COLUMN_NAME AS name FROM information_schema.COLUMNS
     WHERE TABLE_SCHEMA = ? AND TABLE_NAME = ? AND IS_GENERATED = 'NEVER' ORDER BY ORDINAL_POSITION`,
    [database, table],
  );
  return rows.map((row) => String(row['name']));
}

async function textOf(connection: Connection, statement: string, column: string): Promise<string> {
  const [rows] = await connection.query<RowDataPacket[]>(statement);
  return String(rows[0]?.[column]);
}

function quoted(name: string): string {
  return `\`${name.replaceAll('`', '``')}\``;
}
