import type { Clock, Timers } from '../ports/ports';

export interface Nap {
  /** Ends after `ms`, or earlier when woken; a wake that came while nobody slept ends the next nap at once. */
  readonly sleep: (ms: number) => Promise<void>;
  readonly wake: () => void;
  /** Brings the end forward to at most `ms` from now. */
  readonly hasten: (ms: number) => void;
  readonly isWoken: () => boolean;
  /** Forgets the wakes so far. */
  readonly clear: () => void;
  /** Aborts at the next wake: for a request that may be given up. */
  readonly whileAwake: () => AbortSignal;
}

/** A sleep that other things may end: the loop decides how long, never how. */
export function createNap(timers: Timers, clock: Clock): Nap {
  let woken = false;
  let end: { readonly at_ms: number; readonly run: () => void; callOff: () => void } | null = null;
  let awake = new AbortController();
  const finish = () => {
    const ending = end;
    end = null;
    ending?.callOff();
    ending?.run();
  };
  return {
    sleep: (ms) =>
      new Promise((resolve) => {
        if (woken) {
          resolve();
          return;
        }
        end = { at_ms: clock.monotonicMs() + ms, run: resolve, callOff: timers.after(ms, finish) };
      }),
    wake: () => {
      woken = true;
      awake.abort();
      finish();
    },
    hasten: (ms) => {
      if (end === null || end.at_ms <= clock.monotonicMs() + ms) return;
      end.callOff();
      end = { ...end, at_ms: clock.monotonicMs() + ms, callOff: timers.after(ms, finish) };
    },
    isWoken: () => woken,
    clear: () => {
      woken = false;
    },
    whileAwake: () => {
      awake = new AbortController();
      if (woken) awake.abort();
      return awake.signal;
    },
  };
}
