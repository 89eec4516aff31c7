import type { LockOptions, LockOutcome, LockPort } from './ports';

/** Web Locks: shared by all tabs of the origin, and let go by the browser itself when a tab dies. */
export function browserLocks(locks: LockManager): LockPort {
  return {
    hold: async <T>(name: string, options: LockOptions, work: (lost: AbortSignal) => Promise<T>) => {
      const lost = new AbortController();
      try {
        return await locks.request(name, requestOptions(options), async (lock): Promise<LockOutcome<T>> => {
          if (lock === null) return { type: 'busy' };
          return { type: 'held', value: await work(lost.signal) };
        });
      } catch (error) {
        if (!isAbort(error)) throw error;
        if (options.signal?.aborted === true) return { type: 'called-off' };
        lost.abort();
        return { type: 'stolen' };
      }
    },
  };
}

/** The standard forbids a signal together with `steal` or `ifAvailable`: those never wait anyway. */
function requestOptions({ wait, steal, signal }: LockOptions): globalThis.LockOptions {
  if (steal === true) return { steal: true };
  if (wait === 'never') return { ifAvailable: true };
  return signal === undefined ? {} : { signal };
}

function isAbort(error: unknown): boolean {
  return error instanceof DOMException && error.name === 'AbortError';
}
