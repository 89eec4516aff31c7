import type { LabClient } from './lab-client';
import type { StoragePort } from './ports/ports';

export interface StorageState {
  /** Null until the browser has said. */
  readonly persisted: boolean | null;
  readonly used_bytes: number | null;
  readonly quota_bytes: number | null;
  readonly words: string;
}

export interface StorageWatch {
  readonly subscribe: (listen: () => void) => () => void;
  readonly state: () => StorageState;
  readonly refresh: () => Promise<void>;
}

/** Asks the browser to keep the storage, lays in the ballast, and says honestly what came of it (protocol 2.4, 2.5). */
export function createStorageWatch(storage: StoragePort, lab: () => LabClient | null): StorageWatch {
  const listeners = new Set<() => void>();
  let state: StorageState = { persisted: null, used_bytes: null, quota_bytes: null, words: '' };
  const refresh = async () => {
    const persisted = await storage
      .persisted()
      .then((kept) => kept || storage.persist())
      .catch(() => false);
    const { usage, quota } = await storage.estimate().catch(() => ({ usage: undefined, quota: undefined }));
    const roomy = (await lab()?.store.reserve.layIn()) ?? true;
    state = {
      persisted,
      used_bytes: usage ?? null,
      quota_bytes: quota ?? null,
      words: wordsFor(persisted, roomy),
    };
    for (const listen of listeners) listen();
  };
  return {
    subscribe: (listen) => {
      listeners.add(listen);
      if (state.persisted === null && listeners.size === 1) void refresh();
      return () => {
        listeners.delete(listen);
      };
    },
    state: () => state,
    refresh,
  };
}

function wordsFor(persisted: boolean, roomy: boolean): string {
  const kept = persisted
    ? 'The browser keeps this storage.'
    : 'The browser has not promised to keep this storage: it may clear it when the disk runs short.';
  const room = roomy ? '' : ' The disk of this tablet is nearly full: photos stop, entries go on.';
  return `${kept}${room} Clearing the site’s data deletes what has not been handed over.`;
}
