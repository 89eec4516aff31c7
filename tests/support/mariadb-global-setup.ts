import { execFile } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { promisify } from 'node:util';
import type { TestProject } from 'vitest/node';
import { freePort } from '../../server/launch/ports.mjs';
import { createDatabaseSql, createMariaDb } from '../../server/stand-ins/mariadb.mjs';

export interface TestMariaDb {
  readonly host: string;
  readonly port: number;
  readonly user: string;
  readonly password: string;
  /** Migrated once, never written to; what each test works on is a copy of it. */
  readonly base: string;
}

declare module 'vitest' {
  export interface ProvidedContext {
    mariaDb: TestMariaDb;
  }
}

/** One MariaDB for the whole run, in a folder that goes with it. */
export async function setup(project: TestProject): Promise<() => Promise<void>> {
  const folder = await mkdtemp(path.join(tmpdir(), 'holdoff-api-'));
  const database = createMariaDb({ folder, port: await freePort(), outlastsPowerCut: false });
  const settings: TestMariaDb = {
    host: '127.0.0.1',
    port: database.port,
    user: 'holdoff',
    password: randomBytes(18).toString('hex'),
    base: 'holdoff_base',
  };
  const tearDown = async (): Promise<void> => {
    await database.stop();
    await rm(folder, { recursive: true, force: true });
  };
  try {
    await database.initialise();
    await database.start();
    await database.sql(createDatabaseSql({ ...settings, name: settings.base }));
    await database.sql(`GRANT ALL PRIVILEGES ON \`holdoff\\_test\\_%\`.* TO 'holdoff'@'127.0.0.1'`);
    await migrate(settings, folder);
  } catch (error) {
    await tearDown();
    throw error;
  }
  project.provide('mariaDb', settings);
  return tearDown;
}

/** Through the same script as `npm start`, so that a migration that only works in tests shows. */
async function migrate(settings: TestMariaDb, folder: string): Promise<void> {
  await promisify(execFile)(process.execPath, ['--import', 'tsx', 'server/maintenance/migrate.ts'], {
    env: {
      ...process.env,
      HOLDOFF_DATA: folder,
      HOLDOFF_DB_HOST: settings.host,
      HOLDOFF_DB_PORT: String(settings.port),
      HOLDOFF_DB_USER: settings.user,
      HOLDOFF_DB_PASSWORD: settings.password,
      HOLDOFF_DB_NAME: settings.base,
    },
  });
}
