import type { RowDataPacket } from 'mysql2/promise';
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest';
import { copyDatabase, createTestDatabase, type TestDatabase, withConnection } from './test-database';

let original: TestDatabase;
let copy: TestDatabase;

beforeAll(async () => {
  original = await createTestDatabase();
  copy = await createTestDatabase();
});

afterAll(async () => {
  await original.drop();
  await copy.drop();
});

describe('a database for a test', () => {
  it('has what the migrations make', async () => {
    const { base } = inject('mariaDb');
    await withConnection(original.settings, async (connection) => {
      const [rows] = await connection.query<RowDataPacket[]>(
        `SELECT TABLE_NAME AS name, SUM(TABLE_SCHEMA = ?) AS made, SUM(TABLE_SCHEMA = ?) AS copied
         FROM information_schema.TABLES GROUP BY TABLE_NAME HAVING made > 0`,
        [base, original.settings.name],
      );
      expect(rows.length).toBeGreaterThan(0);
      expect(rows.filter((row) => Number(row['copied']) !== 1)).toEqual([]);
    });
  });

  it('keeps keys, computed columns, rows and triggers when copied', async () => {
    await withConnection(original.settings, async (connection) => {
      await connection.query(`USE ${original.settings.name}`);
      await connection.query('CREATE TABLE copied_shelf (id INT PRIMARY KEY)');
      await connection.query(
        `CREATE TABLE copied_book (id INT PRIMARY KEY, shelf INT NOT NULL,
         twice INT AS (id * 2) STORED, FOREIGN KEY (shelf) REFERENCES copied_shelf (id))`,
      );
      await connection.query(
        `CREATE TRIGGER copied_book_stays BEFORE DELETE ON copied_book
         FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'books stay'`,
      );
      await connection.query('INSERT INTO copied_shelf VALUES (1)');
      await connection.query('INSERT INTO copied_book (id, shelf) VALUES (21, 1)');
    });
    await withConnection(copy.settings, async (connection) => {
      const { name } = copy.settings;
      await connection.query(`DROP DATABASE ${name}`);
      await connection.query(`CREATE DATABASE ${name}`);
      await copyDatabase(connection, original.settings.name, name);
    });
    await withConnection(copy.settings, async (connection) => {
      await connection.query(`USE ${copy.settings.name}`);
      const [rows] = await connection.query<RowDataPacket[]>('SELECT id, twice FROM copied_book');
      expect(rows).toEqual([{ id: 21, twice: 42 }]);
      await expect(connection.query('INSERT INTO copied_book (id, shelf) VALUES (2, 9)')).rejects.toThrow(
        /foreign key/,
      );
      await expect(connection.query('DELETE FROM copied_book')).rejects.toThrow('books stay');
    });
  });
});
