import { createContext, use, useEffect, useMemo, useState, type ReactNode } from 'react';
import { applyDisplay, keepDisplay, readDisplay, type DisplaySettings } from './display-settings';

interface Display {
  readonly settings: DisplaySettings;
  readonly change: (settings: DisplaySettings) => void;
}

const DisplayContext = createContext<Display | null>(null);

/** Holds the settings of the screen and writes them on the root element as the place changes. */
export function DisplayProvider({
  place,
  children,
}: {
  readonly place: 'bench' | 'desk';
  readonly children: ReactNode;
}) {
  const [settings, setSettings] = useState(() => readDisplay(window.localStorage));
  useEffect(() => applyDisplay(document.documentElement, settings, place), [settings, place]);
  const display = useMemo(
    () => ({
      settings,
      change: (next: DisplaySettings) => {
        keepDisplay(window.localStorage, next);
        setSettings(next);
      },
    }),
    [settings],
  );
  return <DisplayContext value={display}>{children}</DisplayContext>;
}

export function useDisplay(): Display {
  const display = use(DisplayContext);
  if (display === null) throw new Error('useDisplay needs a DisplayProvider above it');
  return display;
}
