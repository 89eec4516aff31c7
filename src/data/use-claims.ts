import { useMemo, useSyncExternalStore } from 'react';
import type { ClaimDoc } from '../domain/book/documents/claim';
import { openAuthorEntries, type OpenEntry } from '../domain/report/open-author';
import { listenToNothing, useMaybeLab } from './client-context';
import { useOwnEntries } from './use-book';

/** How far back this tablet is searched: claiming is asked for at the next unlocking, not weeks later. */
const SEARCHED = 300;
const NONE = { state: 'loading', documents: [] as readonly ClaimDoc[] } as const;

/** What was said afterwards about entries of one subject whose author was left open. */
export function useClaims(subject: string): readonly ClaimDoc[] {
  const view = useMaybeLab()?.view;
  const { documents } = useSyncExternalStore(
    view?.subscribe ?? listenToNothing,
    () => view?.children('claim', subject) ?? NONE,
  );
  return documents;
}

/** Entries of this tablet without an author that nobody has claimed here, newest first. */
export function useOpenAuthor(): readonly OpenEntry[] {
  const own = useOwnEntries(SEARCHED);
  return useMemo(() => openAuthorEntries(own.map(({ entry }) => entry)), [own]);
}
