import { useEffect, useEffectEvent } from 'react';

/** Calls back on Escape while active. */
export function useEscape(active: boolean, onEscape: () => void): void {
  const fire = useEffectEvent(onEscape);
  useEffect(() => {
    if (!active) return undefined;
    const handle = (event: KeyboardEvent): void => {
      if (event.key === 'Escape') fire();
    };
    document.addEventListener('keydown', handle);
    return () => document.removeEventListener('keydown', handle);
  }, [active]);
}
