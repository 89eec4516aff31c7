import { useSyncExternalStore } from 'react';
import { useClient } from './client-context';
import type { UpdateState } from './pwa';

export function useUpdate(): UpdateState & { readonly accept: () => void } {
  const { update } = useClient();
  const state = useSyncExternalStore(update.subscribe, update.state);
  return { ...state, accept: update.accept };
}
