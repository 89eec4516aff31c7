import type { LockOptions, LockOutcome, LockPort } from '../ports/ports';

interface Holder {
  readonly lost: AbortController;
  readonly taken: () => void;
}

interface Queue {
  holder: Holder | null;
  readonly waiting: (() => void)[];
}

/** Locks of one browser, shared by its tabs. */
export function memoryLockHub() {
  const queues = new Map<string, Queue>();
  const queueOf = (name: string): Queue => {
    const queue = queues.get(name) ?? { holder: null, waiting: [] };
    queues.set(name, queue);
    return queue;
  };
  const free = (queue: Queue) => {
    queue.holder = null;
    queue.waiting.shift()?.();
  };

  const hold = async <T>(
    name: string,
    { wait, steal, signal }: LockOptions,
    work: (lost: AbortSignal) => Promise<T>,
  ): Promise<LockOutcome<T>> => {
    const queue = queueOf(name);
    if (steal === true) {
      queue.holder?.lost.abort();
      queue.holder?.taken();
      queue.holder = null;
    } else if (queue.holder !== null) {
      if (wait === 'never') return { type: 'busy' };
      if (!(await untilFree(queue, signal))) return { type: 'called-off' };
    }
    if (signal?.aborted === true) return { type: 'called-off' };
    return await holdNow(queue, work);
  };
  const holdNow = async <T>(
    queue: Queue,
    work: (lost: AbortSignal) => Promise<T>,
  ): Promise<LockOutcome<T>> => {
    const lost = new AbortController();
    let taken = () => {};
    const stolen = new Promise<LockOutcome<T>>((resolve) => {
      taken = () => {
        resolve({ type: 'stolen' });
      };
    });
    const holder = { lost, taken };
    queue.holder = holder;
    try {
      const held = work(lost.signal).then((value): LockOutcome<T> => ({ type: 'held', value }));
      return await Promise.race([held, stolen]);
    } finally {
      if (queue.holder === holder) free(queue);
    }
  };

  /** A tab's view of the hub; a killed tab lets go of everything it held. */
  return {
    openTab: () => {
      const mine = new Set<() => void>();
      const locks: LockPort = {
        hold: async (name, options, work) => {
          let release = () => {};
          const died = new Promise<LockOutcome<never>>((resolve) => {
            release = () => {
              resolve({ type: 'called-off' });
            };
          });
          mine.add(release);
          const outcome = await hold(name, options, (lost) => Promise.race([work(lost), died.then(never)]));
          mine.delete(release);
          return outcome;
        },
      };
      return {
        locks,
        kill: () => {
          for (const release of mine) release();
        },
      };
    },
  };
}

/** The work of a killed tab has no value, and nobody is left to read it. */
function never(): never {
  return undefined as never;
}

async function untilFree(queue: Queue, signal: AbortSignal | undefined): Promise<boolean> {
  return await new Promise((resolve) => {
    const turn = () => {
      resolve(true);
    };
    queue.waiting.push(turn);
    signal?.addEventListener('abort', () => {
      const at = queue.waiting.indexOf(turn);
      if (at >= 0) queue.waiting.splice(at, 1);
      resolve(false);
    });
  });
}
