import { IDBFactory, IDBKeyRange } from 'fake-indexeddb';
import type { Http, PageEvent, Ports } from '../ports/ports';
import { seededBytes } from './chance';
import { memoryBusHub } from './memory-bus';
import { memoryJournal, type MemoryJournal } from './memory-journal';
import { memoryLockHub } from './memory-locks';
import type { VirtualTime } from './virtual-time';

export interface MemoryTab {
  readonly ports: Ports;
  readonly say: (event: PageEvent) => void;
  readonly setVisible: (visible: boolean) => void;
  /** The tab is gone without a word: its locks are free, its timers never run. */
  readonly kill: () => void;
  /** The tab holds what it holds and does nothing any more, as a tab in the background may. */
  readonly freeze: () => void;
}

export interface MemoryBrowser {
  readonly openTab: () => MemoryTab;
  readonly journal: MemoryJournal;
  readonly small: Map<string, string>;
  readonly indexedDB: () => IDBFactory;
  /** The whole of IndexedDB is gone, as after a torn log (protocol 2.2). */
  readonly emptyIndexedDb: () => void;
}

export interface BrowserWorld {
  readonly time: VirtualTime;
  readonly seed: number;
  readonly http: Http;
  readonly build_ms?: number;
}

/** One browser profile in memory: its tabs share storage, locks and channels. */
export function memoryBrowser({ time, seed, http, build_ms = 0 }: BrowserWorld): MemoryBrowser {
  let factory = new IDBFactory();
  const locks = memoryLockHub();
  const buses = memoryBusHub();
  const journal = memoryJournal();
  const small = new Map<string, string>();
  const random = seededBytes(seed);
  const openTab = (): MemoryTab => {
    const listeners = new Map<PageEvent, Set<() => void>>();
    let visible = true;
    let dead = false;
    const held = locks.openTab();
    const ports: Ports = {
      clock: time.clock(),
      random,
      chance: () => (random(1)[0] ?? 0) / 256,
      timers: {
        after: (ms, run) =>
          time.timers.after(ms, () => {
            if (!dead) run();
          }),
      },
      idb: { indexedDB: factory, IDBKeyRange },
      locks: held.locks,
      openBus: buses.open,
      small: {
        get: (key) => small.get(key) ?? null,
        set: (key, value) => void small.set(key, value),
        remove: (key) => void small.delete(key),
      },
      page: {
        visible: () => visible,
        online: () => true,
        on: (event, run) => {
          const runs = listeners.get(event) ?? new Set();
          listeners.set(event, runs.add(run));
          return () => {
            runs.delete(run);
          };
        },
      },
      journal: journal.files,
      storage: {
        persist: () => Promise.resolve(true),
        persisted: () => Promise.resolve(false),
        estimate: () => Promise.resolve({ usage: 1, quota: 100 }),
      },
      http: (path, request) => (dead ? new Promise(() => {}) : time.working(http(path, request))),
      serviceWorker: null,
      subtle: countedSubtle(time),
      build_ms,
      app_version: 'test',
    };
    return {
      ports,
      say: (event) => {
        for (const run of listeners.get(event) ?? []) run();
      },
      setVisible: (next) => {
        visible = next;
      },
      freeze: () => {
        dead = true;
      },
      kill: () => {
        dead = true;
        held.kill();
      },
    };
  };
  return {
    openTab,
    journal,
    small,
    indexedDB: () => factory,
    emptyIndexedDb: () => {
      factory = new IDBFactory();
    },
  };
}

/** WebCrypto works on threads of its own, which virtual time has to wait for. */
function countedSubtle(time: VirtualTime): SubtleCrypto {
  return new Proxy(crypto.subtle, {
    get: (target, key) => {
      const member: unknown = Reflect.get(target, key);
      if (!(member instanceof Function)) return member;
      return (...input: unknown[]) => time.working(Promise.resolve(Reflect.apply(member, target, input)));
    },
  });
}
