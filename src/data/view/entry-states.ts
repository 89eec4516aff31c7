import type { Reason, SealedEntry } from '../../domain/book/entry';
import type { EntryRow, OwnState } from '../store/book-database';
import type { BookStore } from '../store/book-store';
import type { MirrorStore } from '../store/mirror-store';
import type { BookView } from './book-view';

export interface EntryState {
  readonly place: 'on this tablet' | 'sent' | 'backed up';
  /** 'altered': the Book has this id with another text, and ours went on under a new id. */
  readonly verdict: OwnState | 'altered';
  readonly reason: Reason | null;
  readonly revision: number | null;
}

export interface OwnEntry extends EntryState {
  readonly entry: SealedEntry;
}

interface Fate {
  readonly verdict: EntryState['verdict'];
  readonly reason: Reason | null;
  readonly revision: number | null;
}

export interface StateParts {
  readonly store: BookStore;
  readonly mirror: MirrorStore;
  readonly view: BookView;
  readonly device: () => string;
}

export type EntryStates = ReturnType<typeof openEntryStates>;

/** Where each entry is, so that nothing reads "saved" that is not (protocol 10). */
export function openEntryStates({ store, mirror, view, device }: StateParts) {
  const fates = new Map<string, Fate>();
  const states = new Map<string, EntryState>();
  const asked = new Set<string>();
  const listeners = new Set<() => void>();
  let own: readonly OwnEntry[] = [];
  let ownLimit = 0;

  const notify = () => {
    for (const listen of listeners) listen();
  };
  const toState = (fate: Fate): EntryState => ({
    ...fate,
    place: placeOf(fate, view.cursor().backup_revision),
  });
  const lookUp = async (ids: readonly string[]) => {
    for (const pulled of await mirror.pulledByIds(ids))
      fates.set(pulled.entry.id, {
        verdict: pulled.verdict,
        reason: pulled.reason,
        revision: pulled.revision,
      });
    for (const row of await store.byIds(ids)) fates.set(row.id, fateOf(row));
    for (const row of await store.alteredFrom(ids))
      if (row.altered_from !== null)
        fates.set(row.altered_from, { verdict: 'altered', reason: null, revision: null });
    for (const id of ids) {
      const fate = fates.get(id);
      if (fate !== undefined) states.set(id, toState(fate));
    }
    notify();
  };
  const loadOwn = async () => {
    own = (await store.newest(device(), ownLimit)).map((row) => ({
      ...toState(fateOf(row)),
      entry: row.entry,
    }));
    notify();
  };
  const stopWatching = view.subscribe(() => {
    if (asked.size > 0) void lookUp([...asked]);
    if (ownLimit > 0) void loadOwn();
  });

  return {
    subscribe: (listen: () => void) => {
      listeners.add(listen);
      return () => {
        listeners.delete(listen);
      };
    },
    /** Undefined while it is looked up, and for an id that neither this tablet nor its mirror holds as an entry. */
    get: (id: string): EntryState | undefined => {
      if (!asked.has(id)) {
        asked.add(id);
        void lookUp([id]);
      }
      return states.get(id);
    },
    newestOwn: (limit: number): readonly OwnEntry[] => {
      if (limit > ownLimit) {
        ownLimit = limit;
        void loadOwn();
      }
      return own;
    },
    close: stopWatching,
  };
}

function fateOf({ state, reason, revision }: EntryRow): Fate {
  return { verdict: state, reason, revision };
}

function placeOf({ revision }: Fate, backup_revision: number): EntryState['place'] {
  if (revision === null) return 'on this tablet';
  return revision <= backup_revision ? 'backed up' : 'sent';
}
