import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { freePort } from '../../server/launch/ports.mjs';
import { createMariaDb, type MariaDb } from '../../server/stand-ins/mariadb.mjs';

let folder: string;
let database: MariaDb;

beforeAll(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'holdoff-killed-'));
  database = createMariaDb({ folder, port: await freePort() });
  await database.initialise();
  await database.start();
});

afterAll(async () => {
  await database.stop();
  await rm(folder, { recursive: true, force: true });
});

describe('the database of our own', () => {
  it('sets itself up once', async () => {
    expect(await database.initialise()).toBe(false);
  });

  it('keeps what it had said was written when it is killed', async () => {
    await database.sql('CREATE DATABASE kept; CREATE TABLE kept.rows_kept (id INT PRIMARY KEY)');
    await database.sql('INSERT INTO kept.rows_kept VALUES (1), (2), (3)');
    await database.kill();
    await database.start();
    expect(await database.sql('SELECT COUNT(*) FROM kept.rows_kept')).toBe('3');
  });

  it('says so when it ends by itself, and starts again', async () => {
    const ended = new Promise<string>((resolve) => {
      database.onUnexpectedExit(() => {
        resolve('ended');
      });
    });
    await database.sql('SHUTDOWN');
    expect(await ended).toBe('ended');
    await database.start();
    expect(await database.sql('SELECT 1')).toBe('1');
  });

  it('is found and ended by a later start that did not make it', async () => {
    const later = createMariaDb({ folder, port: database.port });
    expect(await later.stopLeftover()).toBe(true);
    expect(await later.stopLeftover()).toBe(false);
    await database.start();
  });

  it('answers the administrator in words when a statement is wrong', async () => {
    await expect(database.sql('SELECT nonsense')).rejects.toThrow(/nonsense/);
  });
});
