import {
  docKey,
  type DocKey,
  type DocKind,
  type DocOf,
  type Document,
} from '../../domain/book/documents/document';
import { runEffectAsync, type AsyncDocSource } from '../../domain/book/documents/effect';
import type { SealedEntry } from '../../domain/book/entry';
import { judgeEntry } from '../../domain/rules/judge';
import type { Judged } from '../../domain/rules/judge-context';
import type { EntryRow } from '../store/book-database';
import type { BookStore, Waiting } from '../store/book-store';
import { EMPTY_CURSOR, isFilling, type MirrorCursor, type MirrorStore } from '../store/mirror-store';
import { documentCache, HOT_KINDS, isCold, type Children } from './document-cache';
import { foldOwn } from './overlay';

export interface ViewInput {
  readonly store: BookStore;
  readonly mirror: MirrorStore;
  readonly hasGrant: (person: string) => boolean;
}

export interface BookView {
  readonly subscribe: (listen: () => void) => () => void;
  readonly doc: <K extends DocKind>(kind: K, id: string) => DocOf<K> | undefined;
  readonly list: <K extends DocKind>(kind: K) => readonly DocOf<K>[];
  /** By parent; for readings and other kinds of which there are many, loading starts at the first question. */
  readonly children: <K extends DocKind>(kind: K, parent: string) => Children<K>;
  readonly cursor: () => MirrorCursor;
  readonly filling: () => boolean;
  readonly waiting: () => Waiting;
  /** Own rows that the mirror does not hold yet, by id. */
  readonly pendingRow: (id: string) => EntryRow | undefined;
  readonly judge: (entry: SealedEntry) => Promise<Judged>;
  /** Reads everything anew: at the start, and whenever in doubt. */
  readonly reload: () => Promise<void>;
  /** Folds a row that was just appended here; answers what was said of it, null for what waits for the server. */
  readonly appended: (row: EntryRow) => Promise<Judged | null>;
  /** Own rows changed: another tab appended, or the server answered. */
  readonly ownChanged: () => Promise<void>;
  readonly mirrorMoved: (keys: readonly string[] | null) => Promise<void>;
}

/** The live fold: the mirror's documents with this tablet's unconfirmed entries over them (protocol 1.1, 1.4). */
export function openBookView({ store, mirror, hasGrant }: ViewInput): BookView {
  const cache = documentCache();
  const listeners = new Set<() => void>();
  let cursor: MirrorCursor = EMPTY_CURSOR;
  let rows: readonly EntryRow[] = [];
  let rowsById: ReadonlyMap<string, EntryRow> = new Map();
  let waiting: Waiting = { count: 0, oldest_wall_ms: null };
  let queue: Promise<unknown> = Promise.resolve();

  /** One change at a time, in the order in which they were asked for. */
  const inTurn = <T>(work: () => Promise<T>): Promise<T> => {
    const turn = queue.then(work);
    queue = turn.catch(() => undefined);
    return turn;
  };
  const notify = () => {
    for (const listen of listeners) listen();
  };
  const source: AsyncDocSource = {
    get: async (key: DocKey) => (isCold(key.kind) ? await mirror.get(key) : cache.baseOf(docKey(key))),
  };
  const context = { source, hasGrant };
  const setRows = (next: readonly EntryRow[]) => {
    rows = next;
    rowsById = new Map(next.map((row) => [row.id, row]));
    waiting = countWaiting(next);
  };
  const refold = async () => {
    const changed = new Map<string, Document>();
    for (const row of rows) await foldOwn(row, changed, context);
    cache.replaceOverlay(changed);
  };
  const readRows = async () => {
    const found = await store.beyond(cursor.revision);
    setRows(found.filter((row) => row.state === 'waiting' || row.epoch === cursor.epoch));
  };
  const reloadChildren = async () => {
    for (const [kind, parent] of cache.loadedParents())
      cache.putChildren(kind, parent, await mirror.children(kind, parent));
  };

  const view: BookView = {
    subscribe: (listen) => {
      listeners.add(listen);
      return () => {
        listeners.delete(listen);
      };
    },
    doc: <K extends DocKind>(kind: K, id: string) => cache.doc(docKey({ kind, id })) as DocOf<K> | undefined,
    list: cache.list,
    children: <K extends DocKind>(kind: K, parent: string) => {
      if (isCold(kind) && !cache.isLoaded(kind, parent)) void inTurn(() => loadChildren(kind, parent));
      return cache.children(kind, parent);
    },
    cursor: () => cursor,
    filling: () => isFilling(cursor),
    waiting: () => waiting,
    pendingRow: (id) => rowsById.get(id),
    judge: (entry) =>
      inTurn(() =>
        runEffectAsync(
          judgeEntry(entry, { session: entry.author, hasGrant, now_ms: entry.stamp.wall_ms }),
          source,
          new Map(cache.overlay()),
        ),
      ),
    reload: () =>
      inTurn(async () => {
        const content = await mirror.load(HOT_KINDS);
        cursor = content.cursor;
        cache.replaceBase(content.documents);
        await reloadChildren();
        await readRows();
        await refold();
        notify();
      }),
    appended: (row) =>
      inTurn(async () => {
        if (rowsById.has(row.id)) return null;
        const changed = new Map(cache.overlay());
        const judged = await foldOwn(row, changed, context);
        setRows([...rows, row]);
        cache.replaceOverlay(changed);
        notify();
        return judged;
      }),
    ownChanged: () =>
      inTurn(async () => {
        await readRows();
        await refold();
        notify();
      }),
    mirrorMoved: (keys) =>
      keys === null
        ? view.reload()
        : inTurn(async () => {
            const content = await mirror.loadKeys(keys);
            cursor = content.cursor;
            cache.putBase(content.documents);
            await readRows();
            await refold();
            notify();
          }),
  };

  async function loadChildren(kind: DocKind, parent: string): Promise<void> {
    if (cache.isLoaded(kind, parent)) return;
    cache.putChildren(kind, parent, await mirror.children(kind, parent));
    notify();
  }
  return view;
}

function countWaiting(rows: readonly EntryRow[]): Waiting {
  const pending = rows.filter((row) => row.state === 'waiting');
  return { count: pending.length, oldest_wall_ms: pending[0]?.entry.stamp.wall_ms ?? null };
}
