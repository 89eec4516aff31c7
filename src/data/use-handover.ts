import { useCallback, useSyncExternalStore } from 'react';
import { listenToNothing, useMaybeLab } from './client-context';
import { handoverStatus, type HandoverStatus as Status } from './handover/handover-status';

export type HandoverStatus = Status;

const NO_LAB = handoverStatus({
  activity: { type: 'idle' },
  waiting: 0,
  filling: true,
  last_exchange_ms: null,
  upgrade: false,
});

export function useHandover(): HandoverStatus & { readonly exchange: () => void } {
  const handover = useMaybeLab()?.handover;
  const status = useSyncExternalStore(
    handover?.subscribe ?? listenToNothing,
    () => handover?.status() ?? NO_LAB,
  );
  const exchange = useCallback(() => {
    handover?.kick('button');
  }, [handover]);
  return { ...status, exchange };
}
