import { Dexie, type Table } from 'dexie';
import type { DocKind, Document } from '../../domain/book/documents/document';
import type { Pulled } from '../../domain/handover/wire';
import type { IdbPort } from '../ports/ports';

export interface DocRow {
  readonly key: string;
  readonly kind: DocKind;
  /** Parent, or the empty text: IndexedDB cannot index null. */
  readonly parent: string;
  readonly doc: Document;
}

export interface PulledRow {
  readonly revision: number;
  readonly id: string;
  readonly pulled: Pulled;
}

/** Where the mirror stands. `epoch` null: never filled. */
export interface CursorRow {
  readonly key: 'cursor';
  readonly epoch: string | null;
  readonly revision: number;
  readonly hash: string;
  readonly fold_version: number;
  /** Up to here verified backups hold the Book (protocol 3.8). */
  readonly backup_revision: number;
}

/** An entry of an epoch that ended, kept until the new Book is known to have it (protocol 3.11). */
export interface SetAsideRow {
  readonly id: string;
  readonly epoch: string;
  readonly pulled: Pulled;
}

export interface MirrorDatabase extends Dexie {
  readonly documents: Table<DocRow, string>;
  readonly staged: Table<DocRow, string>;
  readonly entries: Table<PulledRow, number>;
  readonly meta: Table<CursorRow, string>;
  readonly set_aside: Table<SetAsideRow, string>;
}

export const MIRROR_PREFIX = 'mirror-';

/** What came from the server. Relaxed: a power cut rewinds documents and cursor together, and the next pull heals it. */
export function mirrorDatabase(lab: string, idb: IdbPort): MirrorDatabase {
  const database = new Dexie(MIRROR_PREFIX + lab, {
    indexedDB: idb.indexedDB,
    IDBKeyRange: idb.IDBKeyRange,
    chromeTransactionDurability: 'relaxed',
    cache: 'disabled',
  });
  database.version(1).stores({
    documents: 'key, kind, [kind+parent]',
    staged: 'key',
    entries: 'revision, &id',
    meta: 'key',
    set_aside: 'id',
  });
  return database as MirrorDatabase;
}
