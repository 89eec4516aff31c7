import { createSyncStoragePersister } from '@tanstack/query-sync-storage-persister';
import type { QueryClient } from '@tanstack/react-query';
import { persistQueryClient } from '@tanstack/react-query-persist-client';
import type { SmallStore } from '../ports/ports';

const THROTTLE_MS = 1000;
const DAY_MS = 24 * 60 * 60_000;
/** Under 24.8 days: a longer timer overflows in the browser and forgets at once. */
export const KEEP_MS = 20 * DAY_MS;

export interface KeeperParts {
  readonly client: QueryClient;
  readonly small: SmallStore;
  readonly key: string;
  /** Answers of another version of the app are not read again. */
  readonly version: string;
}

/** Keeps fetched answers in small synchronous storage; a full or forbidden one only costs the offline copy. */
export function keepQueries({ client, small, key, version }: KeeperParts) {
  // eslint-disable-next-line @typescript-eslint/no-deprecated -- the storage is synchronous, and the page may go at any moment
  const persister = createSyncStoragePersister({
    storage: {
      getItem: (name) => small.get(name),
      setItem: (name, value) => {
        small.set(name, value);
      },
      removeItem: (name) => {
        small.remove(name);
      },
    },
    key,
    throttleTime: THROTTLE_MS,
  });
  const [stop, restored] = persistQueryClient({
    queryClient: client,
    persister,
    maxAge: KEEP_MS,
    buster: version,
  });
  return {
    /** Settles once what was kept has been read back. */
    restored,
    forget: () => {
      void persister.removeClient();
    },
    close: stop,
  };
}
