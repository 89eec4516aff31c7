import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { Config } from '../../server/config';
import { createContext, type Context } from '../../server/context';
import type { Domain } from '../../server/handover/judge-batch';
import { createLogger } from '../../server/logger';
import { serve } from '../../server/serve';
import { createTestDatabase } from './test-database';

export interface TestServer {
  readonly url: string;
  readonly context: Context;
  readonly config: Config;
  /** What the server has logged so far, parsed. */
  readonly logged: () => readonly Readonly<Record<string, unknown>>[];
  readonly stop: () => Promise<void>;
}

export interface TestServerOptions {
  readonly now?: () => number;
  readonly domain?: Domain;
  readonly clientFolder?: string;
  /** Another database than a fresh one, for instance one that a test kills. It is not dropped. */
  readonly database?: Config['database'];
}

/** The real server on a database of its own, on any free port of loopback. */
export async function startTestServer(options: TestServerOptions = {}): Promise<TestServer> {
  const own = options.database === undefined ? await createTestDatabase() : undefined;
  const settings = options.database ?? own?.settings;
  if (settings === undefined) throw new Error('no database');
  const data = await mkdtemp(path.join(tmpdir(), 'holdoff-server-'));
  const { lines, log } = memoryLog();
  const hosts: string[] = [];
  const origins: [string, ...string[]] = [''];
  const config: Config = {
    // The port is known only once the server listens; the guards read these lists at each request.
    http: { host: '127.0.0.1', port: 0, origins, hosts, trustedProxies: 0 },
    database: settings,
    folders: { data, secrets: path.join(data, 'secrets'), client: options.clientFolder },
    logLevel: 'debug',
  };
  const { now, domain } = options;
  const context = createContext({
    config,
    log,
    ...(now === undefined ? {} : { now }),
    ...(domain === undefined ? {} : { domain }),
  });
  const running = await serve(context);
  hosts.push(`127.0.0.1:${running.port}`);
  const url = `http://127.0.0.1:${running.port}`;
  origins[0] = url;
  return {
    url,
    context,
    config,
    logged: () => lines.map((line) => JSON.parse(line) as Record<string, unknown>),
    async stop() {
      await running.stop();
      await own?.drop();
      await rm(data, { recursive: true, force: true });
    },
  };
}

function memoryLog() {
  const lines: string[] = [];
  return { lines, log: createLogger('debug', { write: (line) => void lines.push(line) }) };
}
