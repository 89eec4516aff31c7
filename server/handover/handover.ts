import type { Database } from '../db/database';
import { withoutValues } from '../db/database-errors';
import type { Route } from '../http/route';
import type { Logger } from '../logger';
import { createFounding, type FoundedLab, type Founding } from './founding';
import { handoverRoutes } from './handover-routes';
import { createHandoverService, type HandoverService } from './handover-service';
import { createHeadWatcher } from './head-watcher';
import { holdoffDomain, type Domain } from './judge-batch';
import { createMariaDbBookStore } from './mariadb-book-store';

const pollEveryMs = 300;

export interface HandoverModuleParts {
  readonly database: Database;
  readonly log: Logger;
  readonly now: () => number;
  /** Another domain than Holdoff's own, for tests. */
  readonly domain?: Domain;
}

export interface Handover {
  readonly routes: readonly Route[];
  readonly service: HandoverService;
  /** For seeding and tests; no route reaches it. */
  readonly foundLab: (founding: Founding) => Promise<FoundedLab>;
  /** Lets held-open pulls of this lab look again, for a revocation. */
  readonly wake: (lab: string) => void;
  /** Ends all held-open pulls. */
  readonly close: () => void;
}

export function createHandover({
  database,
  log,
  now,
  domain = holdoffDomain,
}: HandoverModuleParts): Handover {
  const store = createMariaDbBookStore(database);
  const watcher = createHeadWatcher({
    pollEveryMs,
    readHead: async (lab) => (await store.labState(lab))?.revision ?? 0,
    onPollFailed: (error) =>
      log.warn({ error: withoutValues(error) }, 'The head of a Book could not be read for those who wait'),
  });
  const service = createHandoverService({
    store,
    watcher,
    domain,
    now,
    onFault: (entry, error) => log.error({ entry, error }, 'A rule or fold threw; the entry is held back'),
  });
  return {
    routes: handoverRoutes(service, store),
    service,
    foundLab: createFounding({ store, now }),
    wake: (lab) => watcher.announce(lab, Number.POSITIVE_INFINITY),
    close: watcher.close,
  };
}
