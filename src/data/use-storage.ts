import { useSyncExternalStore } from 'react';
import { useClient } from './client-context';
import type { StorageState } from './storage-status';

export function useStorage(): StorageState {
  const { storage } = useClient();
  return useSyncExternalStore(storage.subscribe, storage.state);
}
