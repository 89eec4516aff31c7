import { readConfig } from './config';
import { createContext } from './context';
import { withoutValues } from './db/database-errors';
import { createLogger } from './logger';
import { serve } from './serve';

const read = readConfig(process.env);
if (read.type === 'config-problems') {
  process.stderr.write(`${read.problems.join('\n')}\n`);
  process.exit(1);
}
const { config } = read;
const log = createLogger(config.logLevel);
const server = await serve(createContext({ config, log }));
// `npm start` waits for this line.
process.stdout.write(`holdoff listening ${config.http.origins[0]}\n`);

let stopping = false;
for (const signal of ['SIGTERM', 'SIGINT'] as const) {
  process.on(signal, () => {
    if (stopping) return;
    stopping = true;
    log.info({ signal }, 'stopping');
    server.stop().then(
      () => process.exit(0),
      (error: unknown) => {
        log.error({ error: withoutValues(error) }, 'The server did not stop cleanly');
        process.exit(1);
      },
    );
  });
}
