import { useCallback, useEffect, useSyncExternalStore } from 'react';
import { listenToNothing, useMaybeLab } from './client-context';

export interface WaitHandle {
  /** Monotonic seconds of running page lives, as far as they are durable. */
  readonly waited_s: number;
  readonly running: boolean;
  readonly start: () => void;
  readonly pause: () => void;
}

const NOT_WAITED = { waited_s: 0, running: false };

export function useWait(check: string, step: string): WaitHandle {
  const waits = useMaybeLab()?.waits;
  const key = `${check}/${step}`;
  const state = useSyncExternalStore(
    waits?.subscribe ?? listenToNothing,
    () => waits?.get(key) ?? NOT_WAITED,
  );
  useEffect(() => {
    void waits?.load(key);
  }, [waits, key]);
  const start = useCallback(() => {
    void waits?.start(key);
  }, [waits, key]);
  const pause = useCallback(() => {
    waits?.pause(key);
  }, [waits, key]);
  return { ...state, start, pause };
}
