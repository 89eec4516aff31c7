import { createAccounts, type Accounts } from './accounts/accounts';
import type { Config } from './config';
import { createCrew } from './crew/crew-routes';
import { createDatabase, type Database } from './db/database';
import { createDesk } from './desk/desk-routes';
import { createHandover, type Handover } from './handover/handover';
import type { Domain } from './handover/judge-batch';
import type { Route } from './http/route';
import type { Logger } from './logger';

export interface Context {
  readonly config: Config;
  readonly log: Logger;
  readonly database: Database;
  readonly accounts: Accounts;
  readonly handover: Handover;
  readonly routes: readonly Route[];
  /** Ends what waits, so that a server can stop. The database stays until `close`. */
  readonly release: () => void;
  readonly close: () => Promise<void>;
}

export interface ContextParts {
  readonly config: Config;
  readonly log: Logger;
  /** The server's clock, Unix ms; another one for tests. */
  readonly now?: () => number;
  readonly domain?: Domain;
}

/** The one place where the server is put together. Feature folders know each other only through what is handed on here. */
export function createContext({ config, log, now = Date.now, domain }: ContextParts): Context {
  const database = createDatabase(config.database, log);
  const handover = createHandover({ database, log, now, ...(domain === undefined ? {} : { domain }) });
  const accounts = createAccounts({ database, secretsFolder: config.folders.secrets, now });
  return {
    config,
    log,
    database,
    accounts,
    handover,
    routes: [
      ...accounts.routes,
      ...handover.routes,
      ...createDesk({ database, now }),
      ...createCrew({ database, now, onRevoked: handover.wake }),
    ],
    release: handover.close,
    close: () => database.destroy(),
  };
}
