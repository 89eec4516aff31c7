import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { createApp } from './app';
import type { Context } from './context';

const drainPatienceMs = 8_000;

export interface RunningServer {
  readonly port: number;
  /** Takes nothing new, ends held-open pulls, waits for the rest, then closes the database. */
  readonly stop: () => Promise<void>;
}

export async function serve(context: Context): Promise<RunningServer> {
  const { config, log } = context;
  const server = createServer({ requestTimeout: 60_000, headersTimeout: 15_000 }, createApp(context));
  // Longer than a proxy keeps an idle connection, or it would reuse one that we are just closing.
  server.keepAliveTimeout = 65_000;
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(config.http.port, config.http.host, resolve);
  });
  return {
    port: (server.address() as AddressInfo).port,
    async stop() {
      const closed = new Promise<void>((resolve) => server.close(() => resolve()));
      context.release();
      server.closeIdleConnections();
      const impatient = setTimeout(() => {
        log.warn('Some requests did not end in time and are cut off');
        server.closeAllConnections();
      }, drainPatienceMs);
      await closed;
      clearTimeout(impatient);
      await context.close();
    },
  };
}
