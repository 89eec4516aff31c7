/** Wakes held-open pulls: at once for what this process appends, within a poll for what another one does. */
export interface HeadWatcher {
  /** Returns when the lab's head lies beyond `since`, or the time is over, or nobody waits any more. */
  readonly waitBeyond: (wait: Wait) => Promise<void>;
  readonly announce: (lab: string, revision: number) => void;
  /** Lets everybody go, for good. */
  readonly close: () => void;
}

export interface Wait {
  readonly lab: string;
  readonly since: number;
  readonly wait_ms: number;
  readonly signal: AbortSignal;
}

export interface HeadWatcherParts {
  /** Reads the lab's head revision. */
  readonly readHead: (lab: string) => Promise<number>;
  readonly pollEveryMs: number;
  readonly onPollFailed: (error: unknown) => void;
}

interface Waiter {
  readonly since: number;
  readonly wake: () => void;
}

interface Watched {
  readonly waiters: Set<Waiter>;
  readonly timer: NodeJS.Timeout;
}

/** One poll per lab that anybody waits for, however many wait. */
export function createHeadWatcher({ readHead, pollEveryMs, onPollFailed }: HeadWatcherParts): HeadWatcher {
  const labs = new Map<string, Watched>();
  let closed = false;

  function announce(lab: string, revision: number): void {
    for (const waiter of labs.get(lab)?.waiters ?? []) if (revision > waiter.since) waiter.wake();
  }

  function watch(lab: string): Watched {
    const known = labs.get(lab);
    if (known !== undefined) return known;
    let busy = false;
    const timer = setInterval(() => {
      if (busy) return;
      busy = true;
      readHead(lab)
        .then((revision) => announce(lab, revision), onPollFailed)
        .finally(() => (busy = false));
    }, pollEveryMs);
    const watched = { waiters: new Set<Waiter>(), timer };
    labs.set(lab, watched);
    return watched;
  }

  function leave(lab: string, watched: Watched, waiter: Waiter): void {
    watched.waiters.delete(waiter);
    if (watched.waiters.size > 0) return;
    clearInterval(watched.timer);
    labs.delete(lab);
  }

  return {
    announce,
    waitBeyond: ({ lab, since, wait_ms, signal }) =>
      new Promise((resolve) => {
        if (closed || signal.aborted) {
          resolve();
          return;
        }
        const watched = watch(lab);
        const wake = (): void => {
          clearTimeout(timeout);
          signal.removeEventListener('abort', wake);
          leave(lab, watched, waiter);
          resolve();
        };
        const waiter = { since, wake };
        const timeout = setTimeout(wake, wait_ms);
        signal.addEventListener('abort', wake);
        watched.waiters.add(waiter);
      }),
    close() {
      closed = true;
      for (const { waiters } of [...labs.values()]) for (const waiter of [...waiters]) waiter.wake();
    },
  };
}
