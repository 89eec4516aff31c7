import { useSyncExternalStore } from 'react';
import { useClient } from './client-context';
import type { HoldoffClient } from './holdoff-client';
import type { SessionView } from './session/session-types';

export function useSession(): SessionView {
  const client = useClient();
  return useSyncExternalStore(client.subscribe, client.session);
}

export type SessionActions = Pick<
  HoldoffClient,
  'signIn' | 'setPin' | 'unlock' | 'checkPin' | 'lock' | 'signOut' | 'chooseLab'
>;

export function useSessionActions(): SessionActions {
  return useClient();
}
