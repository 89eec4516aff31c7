import { useMemo, useSyncExternalStore } from 'react';
import type { ReadingDoc } from '../domain/book/documents/reading';
import { listenToNothing, useMaybeLab } from './client-context';
import type { Children } from './view/document-cache';

export interface ReadingsOf {
  readonly state: 'loading' | 'ready';
  readonly readingsOf: (firing: string) => readonly ReadingDoc[];
}

const NONE: readonly never[] = [];
type Look = (firing: string) => Children<'reading'>;

/** Readings of several firings at once. The same object comes back until one of these readings changes. */
export function useReadingsOf(firings: readonly string[]): ReadingsOf {
  const view = useMaybeLab()?.view;
  const snapshot = useMemo(() => {
    const look: Look = (firing) => view?.children('reading', firing) ?? { state: 'loading', documents: NONE };
    return steadySnapshot(firings, look);
  }, [view, firings]);
  return useSyncExternalStore(view?.subscribe ?? listenToNothing, snapshot);
}

/** Any reading that is logged anywhere makes every list anew; whoever fits a curve to them wants to know only of changes. */
export function steadySnapshot(firings: readonly string[], look: Look): () => ReadingsOf {
  let lists: ReadonlyMap<string, Children<'reading'>> | null = null;
  let kept: ReadingsOf = { state: 'loading', readingsOf: () => NONE };
  return () => {
    const before = lists;
    const now = new Map(firings.map((firing) => [firing, look(firing)]));
    const same = before !== null && firings.every((firing) => isSame(before.get(firing), now.get(firing)));
    if (same) return kept;
    lists = now;
    const ready = [...now.values()].every((one) => one.state === 'ready');
    kept = {
      state: ready ? 'ready' : 'loading',
      readingsOf: (firing) => now.get(firing)?.documents ?? NONE,
    };
    return kept;
  };
}

function isSame(a: Children<'reading'> | undefined, b: Children<'reading'> | undefined): boolean {
  if (a === b) return true;
  if (a === undefined || b === undefined || a.state !== b.state) return false;
  return a.documents.length === b.documents.length && a.documents.every((one, i) => one === b.documents[i]);
}
