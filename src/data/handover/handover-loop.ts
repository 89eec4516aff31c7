import type { Chance, Clock, PagePort, SmallStore, Timers } from '../ports/ports';
import type { BookView } from '../view/book-view';
import { asExchanger, type ExchangerPorts } from './exchanger-lock';
import type { Exchange, RoundOutcome } from './exchange';
import { APPEND_RETRY_MS, backoffMs } from './handover-plan';
import { handoverStatus, type Activity, type HandoverStatus } from './handover-status';
import { createNap } from './nap';

const POLL_S = 25;
/** A server that answers a long poll at once must not be asked in a tight circle. */
const SHORTEST_POLL_MS = 1000;
const GREET_EVERY_MS = 30_000;
/** Whatever it waits for, it looks again by itself. */
const PAUSED_RETRY_MS = 60_000;

export type KickReason = 'append' | 'online' | 'visible' | 'session' | 'button';

export interface LoopParts extends ExchangerPorts {
  readonly exchange: Exchange;
  readonly view: BookView;
  readonly chance: Chance;
  readonly clock: Clock;
  readonly timers: Timers;
  readonly page: PagePort;
  readonly small: SmallStore;
}

export interface HandoverLoop {
  readonly subscribe: (listen: () => void) => () => void;
  readonly status: () => HandoverStatus;
  readonly kick: (reason: KickReason) => void;
  readonly start: () => void;
  readonly stop: () => Promise<void>;
}

/** Keeps exchanging: rounds while there is something to do, a long poll while there is not, and always a next try. */
export function createHandoverLoop(parts: LoopParts): HandoverLoop {
  const { exchange, view, clock, timers, page } = parts;
  const listeners = new Set<() => void>();
  const nap = createNap(timers, clock);
  const closing = new AbortController();
  let activity: Activity = { type: 'other-tab' };
  const exchangedKey = `holdoff-exchanged/${parts.lab}`;
  let last_exchange_ms = readTime(parts.small.get(exchangedKey));
  let upgrade = false;
  let running: Promise<void> = Promise.resolve();
  let status = makeStatus();

  function makeStatus(): HandoverStatus {
    const { count: waiting } = view.waiting();
    return handoverStatus({ activity, waiting, filling: view.filling(), last_exchange_ms, upgrade });
  }
  const refresh = () => {
    status = makeStatus();
    for (const listen of listeners) listen();
  };
  const show = (next: Activity) => {
    if (closing.signal.aborted) return;
    activity = next;
    refresh();
  };

  const exchangeUntilLost = async (lost: AbortSignal): Promise<void> => {
    const signal = AbortSignal.any([lost, closing.signal]);
    let failures = 0;
    let greeted_ms = -Infinity;
    while (!signal.aborted) {
      nap.clear();
      show({ type: 'exchanging' });
      const greet = clock.monotonicMs() - greeted_ms > GREET_EVERY_MS;
      if (greet) greeted_ms = clock.monotonicMs();
      const outcome = await guarded(() => exchange.round(signal, { greet }));
      if (outcome.type === 'quiet') {
        failures = 0;
        upgrade = outcome.upgrade;
        last_exchange_ms = clock.wallMs();
        parts.small.set(exchangedKey, String(last_exchange_ms));
        show({ type: 'idle' });
        if (!nap.isWoken() && !(await polled(signal))) greeted_ms = -Infinity;
        continue;
      }
      greeted_ms = -Infinity;
      if (outcome.type === 'displaced') {
        await nap.sleep(SHORTEST_POLL_MS);
        continue;
      }
      failures += 1;
      show(outcome);
      await nap.sleep(outcome.type === 'paused' ? PAUSED_RETRY_MS : backoffMs(failures, parts.chance()));
    }
  };

  /** False when the poll failed: then the next round says hello again. */
  const polled = async (signal: AbortSignal): Promise<boolean> => {
    const began_ms = clock.monotonicMs();
    const outcome = await exchange.poll(POLL_S, AbortSignal.any([signal, nap.whileAwake()]));
    if (signal.aborted || nap.isWoken()) return true;
    const short = clock.monotonicMs() - began_ms < SHORTEST_POLL_MS;
    if (outcome.type === 'went') {
      if (!outcome.value && short) await nap.sleep(SHORTEST_POLL_MS);
      return true;
    }
    if (short) await nap.sleep(SHORTEST_POLL_MS);
    return false;
  };

  const stopListening = [
    page.on('online', () => {
      kick('online');
    }),
    page.on('visible', () => {
      kick('visible');
    }),
    view.subscribe(refresh),
  ];
  function kick(reason: KickReason): void {
    const setback = activity.type === 'later' || activity.type === 'paused';
    if (reason !== 'append' || !setback) nap.wake();
    else if (activity.type === 'later') nap.hasten(APPEND_RETRY_MS);
  }

  return {
    subscribe: (listen) => {
      listeners.add(listen);
      return () => {
        listeners.delete(listen);
      };
    },
    status: () => status,
    kick,
    start: () => {
      running = asExchanger(parts, closing.signal, async (lost) => {
        await exchangeUntilLost(lost);
        if (!closing.signal.aborted) show({ type: 'other-tab' });
      });
    },
    stop: async () => {
      closing.abort();
      nap.wake();
      for (const stop of stopListening) stop();
      await running;
    },
  };
}

function readTime(text: string | null): number | null {
  const time_ms = Number(text ?? Number.NaN);
  return Number.isFinite(time_ms) ? time_ms : null;
}

/** A broken store or a bug must not end the loop: it is said, and tried again. */
async function guarded(work: () => Promise<RoundOutcome>): Promise<RoundOutcome> {
  try {
    return await work();
  } catch (error) {
    return {
      type: 'later',
      state: 'trouble',
      words: `The handover failed on this tablet: ${String(error)}.`,
    };
  }
}
