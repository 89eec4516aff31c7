import { type ChildProcess, spawn, execFile } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { createWriteStream } from 'node:fs';
import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { createInterface } from 'node:readline';
import { promisify } from 'node:util';
import { createConnection, type RowDataPacket } from 'mysql2/promise';
import { freePort } from '../../../server/launch/ports.mjs';
import { createDatabaseSql, createMariaDb, type MariaDb } from '../../../server/stand-ins/mariadb.mjs';

export interface SignIn {
  readonly name: string;
  readonly role: string;
  readonly email: string;
  readonly password: string;
}

/** The demo lab on processes that a test may kill: MariaDB, and the server in front of it. */
export interface LabServer {
  readonly url: string;
  readonly folder: string;
  readonly signIns: readonly SignIn[];
  /** `kill -9`, no goodbye. */
  killServer(): Promise<void>;
  stopServer(): Promise<void>;
  startServer(): Promise<void>;
  /** Rows straight from MariaDB, past the product. */
  rows(sql: string, values?: readonly (string | number)[]): Promise<RowDataPacket[]>;
  close(): Promise<void>;
}

const READY_PATIENCE_MS = 60_000;

export async function openLabServer(): Promise<LabServer> {
  const folder = await mkdtemp(path.join(tmpdir(), 'holdoff-e2e-'));
  const database = createMariaDb({ folder, port: await freePort(), outlastsPowerCut: false });
  const port = await freePort();
  const password = randomBytes(18).toString('hex');
  const env = environment({ folder, port, database, password });
  const running = { child: undefined as ChildProcess | undefined };
  const startServer = async () => {
    running.child = await startChild(env, folder);
  };
  const endServer = async (signal: 'SIGKILL' | 'SIGTERM') => {
    const { child } = running;
    running.child = undefined;
    if (child !== undefined) await ended(child, signal);
  };
  const close = async () => {
    await endServer('SIGTERM');
    await database.stop();
    await rm(folder, { recursive: true, force: true });
  };
  try {
    await database.initialise();
    await database.start();
    await database.sql(createDatabaseSql({ name: 'holdoff', user: 'holdoff', password }));
    await script('server/maintenance/migrate.ts', [], env);
    await script('server/maintenance/seed.ts', ['--if-empty'], env);
    await startServer();
    const signIns = await readSignIns(folder);
    return {
      url: `http://127.0.0.1:${port}`,
      folder,
      signIns,
      startServer,
      killServer: () => endServer('SIGKILL'),
      stopServer: () => endServer('SIGTERM'),
      rows: (sql, values = []) => query({ port: database.port, password }, sql, values),
      close,
    };
  } catch (error) {
    await close();
    throw error;
  }
}

interface Parts {
  readonly folder: string;
  readonly port: number;
  readonly database: MariaDb;
  readonly password: string;
}

function environment({ folder, port, database, password }: Parts): NodeJS.ProcessEnv {
  return {
    ...process.env,
    HOLDOFF_PORT: String(port),
    HOLDOFF_DATA: folder,
    HOLDOFF_DB_PORT: String(database.port),
    HOLDOFF_DB_PASSWORD: password,
    HOLDOFF_LOG_LEVEL: 'info',
  };
}

async function script(file: string, args: readonly string[], env: NodeJS.ProcessEnv): Promise<void> {
  await promisify(execFile)(process.execPath, ['--import', 'tsx', file, ...args], { env });
}

async function startChild(env: NodeJS.ProcessEnv, folder: string): Promise<ChildProcess> {
  const child = spawn(process.execPath, ['--import', 'tsx', 'server/index.ts'], {
    env,
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  const log = createWriteStream(path.join(folder, 'server.log'), { flags: 'a' });
  child.stderr.pipe(log, { end: false });
  const lines = createInterface({ input: child.stdout });
  await new Promise<void>((resolve, reject) => {
    const timer = setTimeout(
      () => reject(new Error(`the server did not start in time, see ${folder}`)),
      READY_PATIENCE_MS,
    );
    child.once('exit', (code) =>
      reject(new Error(`the server ended with ${String(code)} before it was ready`)),
    );
    lines.on('line', (line) => {
      log.write(`${line}\n`);
      if (!line.startsWith('holdoff listening ')) return;
      clearTimeout(timer);
      resolve();
    });
  });
  return child;
}

async function ended(child: ChildProcess, signal: 'SIGKILL' | 'SIGTERM'): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return;
  const exit = new Promise((resolve) => child.once('exit', resolve));
  child.kill(signal);
  await exit;
}

async function readSignIns(folder: string): Promise<readonly SignIn[]> {
  const parsed: unknown = JSON.parse(await readFile(path.join(folder, 'demo-sign-ins.json'), 'utf8'));
  return (Array.isArray(parsed) ? parsed : (parsed as { people: SignIn[] }).people) as readonly SignIn[];
}

async function query(
  at: { readonly port: number; readonly password: string },
  sql: string,
  values: readonly (string | number)[],
) {
  const connection = await createConnection({
    host: '127.0.0.1',
    port: at.port,
    user: 'holdoff',
    password: at.password,
    database: 'holdoff',
  });
  try {
    const [rows] = await connection.query<RowDataPacket[]>(sql, [...values]);
    return rows;
  } finally {
    await connection.end();
  }
}
