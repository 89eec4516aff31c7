import { createContext, use, useState, useSyncExternalStore, type ReactNode } from 'react';
import { IDLE_HOLD, type HoldView } from './hold';

/** Where holds and the strip meet: a hold reports here, the strip draws it. Only what subscribes is drawn anew. */
export interface HoldStageStore {
  readonly read: () => HoldView;
  readonly publish: (view: HoldView) => void;
  readonly subscribe: (listener: () => void) => () => void;
}

export function createHoldStage(): HoldStageStore {
  let view = IDLE_HOLD;
  const listeners = new Set<() => void>();
  return {
    read: () => view,
    publish: (next) => {
      view = next;
      for (const listener of listeners) listener();
    },
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
}

const StageContext = createContext<HoldStageStore | null>(null);

export function HoldStage({ children }: { readonly children: ReactNode }) {
  const [stage] = useState(createHoldStage);
  return <StageContext value={stage}>{children}</StageContext>;
}

export function useHoldStage(): HoldStageStore | null {
  return use(StageContext);
}

const neverChanges = (): (() => void) => () => undefined;
const idle = (): HoldView => IDLE_HOLD;

export function useHoldView(): HoldView {
  const stage = use(StageContext);
  return useSyncExternalStore(stage?.subscribe ?? neverChanges, stage?.read ?? idle);
}
