import { appVersion, buildTime } from '../../config/build';
import { workerJournalFiles } from '../journal/worker-files';
import { browserLocks } from './browser-locks';
import { browserServiceWorker } from './browser-service-worker';
import type { Bus, BusMessage, PageEvent, PagePort, Ports, SmallStore } from './ports';

/** The real world. Needs a secure context (https, or loopback), as locks, OPFS and WebCrypto do. */
export function browserPorts(): Ports {
  return {
    clock: {
      wallMs: () => Date.now(),
      monotonicMs: () => performance.now(),
      offsetMin: (wall_ms) => -new Date(wall_ms).getTimezoneOffset(),
      zone: () => Intl.DateTimeFormat().resolvedOptions().timeZone,
    },
    random: (count) => crypto.getRandomValues(new Uint8Array(count)),
    chance: () => Math.random(),
    timers: {
      after: (ms, run) => {
        const timer = setTimeout(run, ms);
        return () => {
          clearTimeout(timer);
        };
      },
    },
    idb: { indexedDB, IDBKeyRange },
    locks: browserLocks(navigator.locks),
    openBus: browserBus,
    small: browserSmallStore(),
    page: browserPage(),
    journal: workerJournalFiles(
      () => new Worker(new URL('../journal/journal-worker.ts', import.meta.url), { type: 'module' }),
    ),
    storage: navigator.storage,
    http: (path, { method, headers, body, signal }) =>
      fetch(path, {
        method,
        headers,
        body,
        signal,
        credentials: 'same-origin',
        redirect: 'error',
        cache: 'no-store',
      }),
    serviceWorker: import.meta.env.PROD ? browserServiceWorker() : null,
    subtle: crypto.subtle,
    build_ms: Date.parse(buildTime),
    app_version: appVersion,
  };
}

function browserBus(name: string): Bus {
  const channel = new BroadcastChannel(name);
  return {
    post: (message) => {
      channel.postMessage(message);
    },
    subscribe: (listen) => {
      const heard = (event: MessageEvent<BusMessage>) => {
        listen(event.data);
      };
      channel.addEventListener('message', heard);
      return () => {
        channel.removeEventListener('message', heard);
      };
    },
    close: () => {
      channel.close();
    },
  };
}

/** localStorage throws when full or forbidden; nothing that matters stands in it, so a failure reads as absent. */
function browserSmallStore(): SmallStore {
  const quietly = <T>(work: () => T, otherwise: T): T => {
    try {
      return work();
    } catch {
      return otherwise;
    }
  };
  return {
    get: (key) => quietly(() => localStorage.getItem(key), null),
    set: (key, value) => {
      quietly(() => {
        localStorage.setItem(key, value);
      }, undefined);
    },
    remove: (key) => {
      quietly(() => {
        localStorage.removeItem(key);
      }, undefined);
    },
  };
}

function browserPage(): PagePort {
  return {
    visible: () => document.visibilityState === 'visible',
    online: () => navigator.onLine,
    on: (event, run) => {
      const [target, name, wanted] = sourceOf(event);
      const heard = () => {
        if (wanted()) run();
      };
      target.addEventListener(name, heard);
      return () => {
        target.removeEventListener(name, heard);
      };
    },
  };
}

function sourceOf(event: PageEvent): readonly [EventTarget, string, () => boolean] {
  switch (event) {
    case 'visible':
      return [document, 'visibilitychange', () => document.visibilityState === 'visible'];
    case 'hidden':
      return [document, 'visibilitychange', () => document.visibilityState === 'hidden'];
    case 'online':
    case 'offline':
      return [globalThis, event, () => true];
  }
}
