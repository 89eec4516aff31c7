import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { migrationSource } from '../../migrations/migration-source';
import { createTestDatabase, type TestDatabase } from '../../tests/support/test-database';
import { createLogger } from '../logger';
import { createDatabase, type Database } from './database';
import { migrateToLatest } from './migrate';

describe('the schema', () => {
  let made: TestDatabase;
  let database: Database;
  beforeAll(async () => {
    made = await createTestDatabase();
    database = createDatabase(made.settings, createLogger('silent'));
  });
  afterAll(async () => {
    await database.destroy();
    await made.drop();
  });

  const tables = async () => {
    const [rows] = (await database.raw(
      `SELECT TABLE_NAME AS name FROM information_schema.TABLES WHERE TABLE_SCHEMA = DATABASE() AND TABLE_NAME NOT LIKE 'knex%' ORDER BY 1`,
    )) as [{ name: string }[]];
    return rows.map((row) => row.name);
  };

  it('goes down to nothing and up again', async () => {
    const before = await tables();
    expect(before).toContain('entries');
    expect(await migrateToLatest(database, migrationSource)).toEqual([]);
    await database.migrate.rollback({ migrationSource }, true);
    expect(await tables()).toEqual([]);
    expect(await migrateToLatest(database, migrationSource)).toHaveLength(3);
    expect(await tables()).toEqual(before);
  });

  it('leads every key of a lab’s data with the lab', async () => {
    const [rows] = (await database.raw(
      `SELECT TABLE_NAME AS name, COLUMN_NAME AS first FROM information_schema.STATISTICS
       WHERE TABLE_SCHEMA = DATABASE() AND INDEX_NAME = 'PRIMARY' AND SEQ_IN_INDEX = 1`,
    )) as [{ name: string; first: string }[]];
    const across = ['labs', 'people', 'sign_in_counts'];
    const ofLabs = rows.filter((row) => !across.includes(row.name) && !row.name.startsWith('knex'));
    expect(ofLabs.length).toBeGreaterThan(6);
    for (const { name, first } of ofLabs) expect([name, first]).toEqual([name, 'lab']);
  });

  it('itself refuses what the code must never write', async () => {
    const lab = randomUUID();
    const device = randomUUID();
    const insertLab = (more: object = {}) =>
      database('labs').insert({
        id: lab,
        name: 'Bench',
        epoch: randomUUID(),
        chain_hash: '0'.repeat(64),
        fold_version: 1,
        created_ms: 1,
        ...more,
      });
    await expect(insertLab({ chain_hash: 'short' })).rejects.toMatchObject({ errno: 4025 });
    await insertLab();
    await expect(insertLab()).rejects.toMatchObject({ errno: 1062 });
    await database('devices').insert({ lab, id: device, letter: 'A', name: 'Tablet', enrolled_ms: 1 });
    await expect(
      database('devices').insert({ lab, id: randomUUID(), letter: 'A', name: 'Twin', enrolled_ms: 1 }),
    ).rejects.toMatchObject({ errno: 1062 });
    await expect(
      database('devices').insert({ lab, id: randomUUID(), letter: 'a1', name: 'Odd', enrolled_ms: 1 }),
    ).rejects.toMatchObject({ errno: 4025 });
    const stub = {
      lab,
      revision: 1,
      id: randomUUID(),
      device,
      seq: 1,
      body_bytes: 0,
      entry_sha: 'e'.repeat(64),
      stub_why: 'long',
      verdict: 'held-back',
      reason: '{}',
      received_ms: 1,
      chain_hash: 'c'.repeat(64),
    };
    const insert = (more: object) => database('entries').insert({ ...stub, ...more });
    for (const wrong of [
      { verdict: 'refused' },
      { verdict: 'applied' },
      { reason: null },
      { reason: 'no json' },
      { seq: 0 },
      { stub_why: null },
      { kind: 'rig.created' },
    ]) {
      await expect(insert(wrong).then(() => wrong)).rejects.toMatchObject({ errno: 4025 });
    }
    await expect(insert({ device: randomUUID() })).rejects.toMatchObject({ errno: 1452 });
    await insert({});
    await expect(insert({ revision: 2 })).rejects.toMatchObject({ errno: 1062 });
  });
});
