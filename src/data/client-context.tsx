import { createContext, use, useSyncExternalStore, type ReactNode } from 'react';
import type { HoldoffClient } from './holdoff-client';
import type { LabClient } from './lab-client';

const ClientContext = createContext<HoldoffClient | null>(null);

interface ClientProviderProps {
  readonly client: HoldoffClient;
  readonly children: ReactNode;
}

export function ClientProvider({ client, children }: ClientProviderProps) {
  return <ClientContext value={client}>{children}</ClientContext>;
}

export function useClient(): HoldoffClient {
  const client = use(ClientContext);
  if (client === null) throw new Error('the data hooks need a ClientProvider above them');
  return client;
}

/** The lab that is open on this tablet; null before the first sign-in. */
export function useMaybeLab(): LabClient | null {
  const client = useClient();
  return useSyncExternalStore(client.subscribe, client.lab);
}

export function useLabClient(): LabClient {
  const lab = useMaybeLab();
  if (lab === null) throw new Error('no lab is open on this tablet');
  return lab;
}

/** For hooks that have nothing to listen to before a lab is open. */
export function listenToNothing(): () => void {
  return () => {};
}
