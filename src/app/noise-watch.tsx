import { createContext, use, useEffect, useState, useSyncExternalStore, type ReactNode } from 'react';
import { useNoiseGuard } from '../components/use-noise-guard';
import { useAppend } from '../data/use-append';
import { useBookState } from '../data/use-book';
import { useDisplay } from '../data/use-display';
import { createNoiseStore, type NoiseStore } from './noise-store';

const NoiseContext = createContext<NoiseStore | null>(null);
const COUNT_EVERY_MS = 60_000;
const REFERENCE_PX_PER_MM = 5.2;

/** Watches over touches for the whole app; what was ignored is said in the strip and counted in the Book. */
export function NoiseProvider({ children }: { readonly children: ReactNode }) {
  const [store] = useState(createNoiseStore);
  const { settings } = useDisplay();
  useNoiseGuard({ onNoise: store.heard, mm_px: settings.px_per_mm ?? REFERENCE_PX_PER_MM });
  return (
    <NoiseContext value={store}>
      <NoiseCounter store={store} />
      {children}
    </NoiseContext>
  );
}

export function useNoiseWords(): string | null {
  const store = use(NoiseContext);
  if (store === null) throw new Error('useNoiseWords needs a NoiseProvider above it');
  return useSyncExternalStore(store.subscribe, store.words);
}

function NoiseCounter({ store }: { readonly store: NoiseStore }) {
  const append = useAppend();
  const { device } = useBookState();
  useEffect(() => {
    const timer = setInterval(() => {
      const touches_ignored = store.take();
      if (touches_ignored === 0 || device === '') return;
      const body = { touches_ignored, over_s: COUNT_EVERY_MS / 1000 };
      void append({ kind: 'noise.counted', subject: device, body }).then((outcome) => {
        if (outcome.type !== 'logged') store.giveBack(touches_ignored);
      });
    }, COUNT_EVERY_MS);
    return () => clearInterval(timer);
  }, [append, device, store]);
  return null;
}
