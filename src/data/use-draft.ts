import { useCallback, useSyncExternalStore } from 'react';
import type { DraftSave } from './bench/drafts';
import { listenToNothing, useMaybeLab } from './client-context';
import { useSession } from './use-session';

export interface DraftHandle<T> {
  readonly value: T;
  readonly set: (next: T | ((now: T) => T)) => void;
  readonly clear: () => void;
  /** It was there before this page life. */
  readonly restored: boolean;
  readonly save: DraftSave;
  /** Another person has a draft under this key; what it says is theirs. */
  readonly someone_elses: boolean;
}

/**
 * What is typed and not logged yet, under a key of the screen's own. It belongs to the person who is open. The shape of a
 * kept draft is the screen's business: change the key when it changes.
 */
export function useDraft<T>(key: string, initial: T): DraftHandle<T> {
  const drafts = useMaybeLab()?.drafts;
  const session = useSession();
  const person = session.state === 'open' ? session.person.id : null;
  const state = useSyncExternalStore(drafts?.subscribe ?? listenToNothing, () =>
    drafts?.get({ person, key }),
  );
  const set = useCallback(
    (next: T | ((now: T) => T)) => {
      const now = drafts?.get({ person, key });
      const before = now === undefined ? initial : (now.value as T);
      drafts?.set({ person, key }, next instanceof Function ? next(before) : next);
    },
    [drafts, person, key, initial],
  );
  const clear = useCallback(() => {
    drafts?.clear({ person, key });
  }, [drafts, person, key]);
  return {
    value: state === undefined ? initial : (state.value as T),
    set,
    clear,
    restored: state?.restored ?? false,
    save: state?.save ?? 'saved',
    someone_elses: drafts?.someoneElses({ person, key }) ?? false,
  };
}
