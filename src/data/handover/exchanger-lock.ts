import type { Bus, Clock, LockPort, PagePort, Timers } from '../ports/ports';

const BEAT_MS = 5000;
const SILENCE_MS = 30_000;

export interface ExchangerPorts {
  readonly lab: string;
  readonly page_life: string;
  readonly locks: LockPort;
  readonly bus: Bus;
  readonly clock: Clock;
  readonly timers: Timers;
  readonly page: PagePort;
}

/**
 * Runs `work` while this tab is the one exchanger of the lab in this browser (protocol 3.9). A holder that gives no sign
 * for 30 s is taken over by a visible tab; the old one may go on for a while, so whatever it writes has to be guarded by
 * the mirror's cursor. Ends when `signal` does.
 */
export async function asExchanger(
  ports: ExchangerPorts,
  signal: AbortSignal,
  work: (lost: AbortSignal) => Promise<void>,
): Promise<void> {
  const name = `holdoff-exchanger/${ports.lab}`;
  while (!signal.aborted) {
    const watch = watchHolder(ports, signal);
    const outcome = await ports.locks.hold(name, { wait: 'for-ever', signal: watch.silent }, async (lost) => {
      watch.stop();
      await whileBeating(ports, lost, work);
    });
    watch.stop();
    if (outcome.type === 'called-off' && watch.isSilent()) {
      await ports.locks.hold(name, { wait: 'never', steal: true }, (lost) => whileBeating(ports, lost, work));
    }
  }
}

/** Calls the waiting off once the holder has been silent for too long. */
function watchHolder({ bus, clock, timers, page }: ExchangerPorts, signal: AbortSignal) {
  const giveUp = new AbortController();
  let heard_ms = clock.monotonicMs();
  let silent = false;
  let callOff = () => {};
  const unsubscribe = bus.subscribe((message) => {
    if (message.type === 'beat') heard_ms = clock.monotonicMs();
  });
  const look = () => {
    callOff = timers.after(BEAT_MS, () => {
      if (page.visible() && clock.monotonicMs() - heard_ms > SILENCE_MS) {
        silent = true;
        giveUp.abort();
      } else look();
    });
  };
  const end = () => {
    giveUp.abort();
  };
  signal.addEventListener('abort', end);
  look();
  return {
    silent: giveUp.signal,
    isSilent: () => silent,
    stop: () => {
      callOff();
      unsubscribe();
      signal.removeEventListener('abort', end);
    },
  };
}

async function whileBeating(
  { bus, timers, page_life }: ExchangerPorts,
  lost: AbortSignal,
  work: (lost: AbortSignal) => Promise<void>,
): Promise<void> {
  let callOff = () => {};
  const beat = () => {
    bus.post({ type: 'beat', page_life });
    callOff = timers.after(BEAT_MS, beat);
  };
  beat();
  try {
    await work(lost);
  } finally {
    callOff();
  }
}
