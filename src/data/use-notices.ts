import { useMemo, useSyncExternalStore } from 'react';
import { useClient } from './client-context';

export interface Notices {
  /** What went wrong at the start, in words, until somebody has read it. */
  readonly notices: readonly string[];
  readonly seen: () => Promise<void>;
}

const BREAK = '\n';

export function useNotices(): Notices {
  const client = useClient();
  // The client keeps one list that it empties: only its text tells that it has changed.
  const text = useSyncExternalStore(client.subscribe, () => client.notices.join(BREAK));
  return useMemo(
    () => ({ notices: text === '' ? [] : text.split(BREAK), seen: client.noticesSeen }),
    [text, client],
  );
}
