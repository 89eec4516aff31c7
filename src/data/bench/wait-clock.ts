import type { Clock, LockPort, Timers } from '../ports/ports';
import { getCount, putCount } from '../store/book-keys';
import type { BookStore } from '../store/book-store';

const TICK_MS = 1000;

export interface WaitState {
  readonly waited_s: number;
  readonly running: boolean;
}

const UNKNOWN: WaitState = { waited_s: 0, running: false };

export interface WaitPorts {
  readonly store: BookStore;
  readonly clock: Clock;
  readonly timers: Timers;
  readonly locks: LockPort;
}

export type WaitClock = ReturnType<typeof openWaitClock>;

/**
 * Waits of check steps, in monotonic time of running page lives only, the sum durable every second: neither a reload nor
 * a wall clock ever shortens a wait (protocol 1.8). `key` is check and step.
 */
export function openWaitClock({ store, clock, timers, locks }: WaitPorts) {
  const states = new Map<string, WaitState>();
  const stops = new Map<string, () => void>();
  const listeners = new Set<() => void>();
  const put = (key: string, state: WaitState) => {
    states.set(key, state);
    for (const listen of listeners) listen();
  };
  const saved = (key: string) => getCount(store.database, `wait/${key}`);

  /** Adds what has passed since the last tick, but shows it only once it is durable. */
  const count = async (key: string, stop: AbortSignal): Promise<void> => {
    let sum_s = await saved(key);
    let counted_ms = clock.monotonicMs();
    put(key, { waited_s: sum_s, running: true });
    const stopped = aborted(stop);
    while (!stop.aborted) {
      await Promise.race([tick(timers), stopped]);
      const now_ms = clock.monotonicMs();
      const next_s = sum_s + Math.max(0, now_ms - counted_ms) / 1000;
      const outcome = await store.write(() => putCount(store.database, `wait/${key}`, next_s));
      if (outcome.type === 'not-saved') continue;
      sum_s = next_s;
      counted_ms = now_ms;
      put(key, { waited_s: sum_s, running: !stop.aborted });
    }
    put(key, { waited_s: sum_s, running: false });
  };

  return {
    subscribe: (listen: () => void) => {
      listeners.add(listen);
      return () => {
        listeners.delete(listen);
      };
    },
    get: (key: string): WaitState => states.get(key) ?? UNKNOWN,
    load: async (key: string) => {
      if (!states.has(key)) put(key, { waited_s: await saved(key), running: false });
    },
    /** Does nothing while it runs already, here or in another tab: two tabs must not count one minute twice. */
    start: async (key: string): Promise<void> => {
      if (stops.has(key)) return;
      const stop = new AbortController();
      stops.set(key, () => {
        stop.abort();
      });
      await locks.hold(`holdoff-wait/${store.lab}/${key}`, { wait: 'never' }, () => count(key, stop.signal));
      stops.delete(key);
    },
    pause: (key: string) => {
      stops.get(key)?.();
    },
    close: () => {
      for (const stop of stops.values()) stop();
    },
  };
}

function tick(timers: Timers): Promise<void> {
  return new Promise((resolve) => {
    timers.after(TICK_MS, resolve);
  });
}

function aborted(signal: AbortSignal): Promise<void> {
  return new Promise((resolve) => {
    signal.addEventListener('abort', () => {
      resolve();
    });
  });
}
