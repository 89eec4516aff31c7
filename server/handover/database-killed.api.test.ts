import { execFile } from 'node:child_process';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { promisify } from 'node:util';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Problem } from '../../src/domain/handover/problem';
import { createTestLab, testSpec } from '../../tests/support/test-lab';
import { startTestServer, type TestServer } from '../../tests/support/test-server';
import { freePort } from '../launch/ports.mjs';
import { createDatabaseSql, createMariaDb, type MariaDb } from '../stand-ins/mariadb.mjs';

const account = { name: 'holdoff_killed', user: 'holdoff', password: 'only-for-this-test' };
const rigBody = { name: 'Kettle', number: '1A', spec: testSpec };

describe('a database that is killed', () => {
  let folder: string;
  let mariaDb: MariaDb;
  let server: TestServer;
  beforeAll(async () => {
    folder = await mkdtemp(path.join(tmpdir(), 'holdoff-killed-'));
    mariaDb = createMariaDb({ folder, port: await freePort() });
    await mariaDb.initialise();
    await mariaDb.start();
    await mariaDb.sql(createDatabaseSql(account));
    const database = { host: '127.0.0.1', port: mariaDb.port, ...account };
    await promisify(execFile)(process.execPath, ['--import', 'tsx', 'server/maintenance/migrate.ts'], {
      env: {
        ...process.env,
        HOLDOFF_DATA: folder,
        HOLDOFF_DB_PORT: String(database.port),
        HOLDOFF_DB_PASSWORD: account.password,
        HOLDOFF_DB_NAME: account.name,
      },
    });
    server = await startTestServer({ database });
  });
  afterAll(async () => {
    await server.stop();
    await mariaDb.stop();
    await rm(folder, { recursive: true, force: true });
  });

  it('answers 503 in the middle of a batch, keeps what was acknowledged, and applies the retry once', async () => {
    const lab = await createTestLab(server);
    const tablet = await lab.tablet(await lab.join('operator'));
    const kept = await tablet.write('rig.created', null, rigBody);
    expect(kept.result.outcome).toBe('applied');
    const batch = Array.from({ length: 20 }, () => tablet.seal('rig.created', null, rigBody));

    // Somebody holds the lab's lock, so the batch is in the middle of its transaction when the database dies.
    const holding = server.context.database.transaction();
    const holder = await holding;
    await holder('labs').select('labs.id').where({ id: lab.id }).forUpdate();
    const pushing = tablet.push(batch);
    await waitUntil(
      async () =>
        (await mariaDb.sql(
          `SELECT COUNT(*) FROM information_schema.INNODB_TRX WHERE trx_state = 'LOCK WAIT'`,
        )) !== '0',
    );
    await mariaDb.kill();
    const answer = await pushing;
    await holder.rollback().catch(() => undefined);
    expect([answer.status, (answer.body as unknown as Problem).type]).toEqual([
      503,
      'urn:holdoff:problem:unavailable',
    ]);

    expect((await tablet.push(batch)).status).toBe(503);
    await mariaDb.start();
    const retried = await tablet.push(batch);
    expect(retried.status).toBe(200);
    expect(new Set(retried.body.results.map((one) => one.outcome))).toEqual(new Set(['applied']));
    const again = await tablet.push(batch);
    expect(again.body.results).toEqual(retried.body.results);
    const all = await tablet.pullAll();
    expect(all.map((one) => one.revision)).toEqual(all.map((_, at) => at + 1));
    const ids = all.map((one) => one.entry.id);
    expect(ids.filter((id) => id === kept.entry.id)).toHaveLength(1);
    for (const { id } of batch) expect(ids.filter((one) => one === id)).toHaveLength(1);
  });
});

async function waitUntil(holds: () => Promise<boolean>): Promise<void> {
  while (!(await holds())) await new Promise((resolve) => setTimeout(resolve, 20));
}
