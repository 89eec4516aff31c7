import { useEffect, useEffectEvent } from 'react';
import { FOOT_KEY_UP, FOOT_KEYS, FOOT_STAND_DOWN_MS, stepFootKey, type FootKeyEvent } from './foot-key';

interface FootKeyOptions {
  readonly enabled: boolean;
  readonly keys?: readonly string[];
  readonly onLog: () => void;
  readonly onStandDown: () => void;
}

/** Listens for the wired foot key wherever the focus is: a foot does not care what a thumb has open. */
export function useFootKey({ enabled, keys = FOOT_KEYS, onLog, onStandDown }: FootKeyOptions): void {
  const act = useEffectEvent((what: 'log' | 'stand-down') => {
    if (what === 'log') onLog();
    else onStandDown();
  });
  const isFootKey = useEffectEvent(
    (event: KeyboardEvent) => keys.includes(event.key) || keys.includes(event.code),
  );

  useEffect(() => {
    if (!enabled) return;
    let state = FOOT_KEY_UP;
    let timer: ReturnType<typeof setTimeout> | undefined;
    const feed = (event: FootKeyEvent): void => {
      const step = stepFootKey(state, event);
      state = step.state;
      if (state.phase !== 'down') clearTimeout(timer);
      if (step.act !== null) act(step.act);
    };
    const down = (event: KeyboardEvent): void => {
      if (!isFootKey(event)) return;
      event.preventDefault();
      const first = state.phase === 'up';
      feed({ type: 'down', at_ms: event.timeStamp });
      if (!first) return;
      const due_ms = event.timeStamp + FOOT_STAND_DOWN_MS;
      timer = setTimeout(() => {
        feed({ type: 'tick', at_ms: due_ms });
      }, FOOT_STAND_DOWN_MS);
    };
    const up = (event: KeyboardEvent): void => {
      if (!isFootKey(event)) return;
      event.preventDefault();
      feed({ type: 'up', at_ms: event.timeStamp });
    };
    const lost = (): void => {
      feed({ type: 'lost' });
    };
    window.addEventListener('keydown', down, true);
    window.addEventListener('keyup', up, true);
    window.addEventListener('blur', lost);
    return () => {
      clearTimeout(timer);
      window.removeEventListener('keydown', down, true);
      window.removeEventListener('keyup', up, true);
      window.removeEventListener('blur', lost);
    };
  }, [enabled]);
}
