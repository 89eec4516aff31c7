import { Dexie, type Table } from 'dexie';
import type { Reason, SealedEntry, Verdict } from '../../domain/book/entry';
import type { IdbPort } from '../ports/ports';

export type OwnState = 'waiting' | Verdict;

export interface EntryRow {
  readonly device: string;
  readonly seq: number;
  readonly id: string;
  readonly entry: SealedEntry;
  readonly state: OwnState;
  /** Revision and the epoch that it belongs to; null until the server answered. */
  readonly revision: number | null;
  readonly epoch: string | null;
  readonly reason: Reason | null;
  readonly acknowledged_ms: number | null;
  /** Why only a stub of it can travel (protocol 3.7); null while it goes whole. */
  readonly stub: string | null;
  /** The id that the server has with another text: the first stands, and this text goes on under its own (protocol 3.4). */
  readonly altered_from: string | null;
}

export interface KeyRow {
  readonly key: string;
  readonly value: unknown;
}

export interface DraftRow {
  /** Person, or the empty text while nobody was open. */
  readonly person: string;
  readonly key: string;
  readonly value: unknown;
  readonly changed_ms: number;
}

export interface PinRecord {
  readonly salt: Uint8Array<ArrayBuffer>;
  readonly hash: Uint8Array<ArrayBuffer>;
  readonly iterations: number;
}

export interface PersonRow {
  readonly id: string;
  readonly name: string;
  readonly pin: PinRecord | null;
  readonly failures: number;
  readonly granted_ms: number;
  readonly online: 'signed-in' | 'sign-in-needed';
}

export interface PhotoRow {
  readonly sha256: string;
  readonly part: number;
  readonly parts: number;
  readonly bytes: ArrayBuffer;
}

export interface BallastRow {
  readonly part: number;
  readonly bytes: ArrayBuffer;
}

export interface BookDatabase extends Dexie {
  readonly entries: Table<EntryRow, [string, number]>;
  readonly keys: Table<KeyRow, string>;
  readonly drafts: Table<DraftRow, [string, string]>;
  readonly people: Table<PersonRow, string>;
  readonly photos: Table<PhotoRow, [string, number]>;
  readonly ballast: Table<BallastRow, number>;
}

export const BOOK_PREFIX = 'book-';

/**
 * What this tablet wrote and must never lose. Strict, because Chromium's default loses acknowledged writes at a power
 * cut (protocol 2.1). Upgrades only ever add, and never rewrite `entries` (protocol 2.5).
 */
export function bookDatabase(lab: string, idb: IdbPort): BookDatabase {
  const database = new Dexie(BOOK_PREFIX + lab, {
    indexedDB: idb.indexedDB,
    IDBKeyRange: idb.IDBKeyRange,
    chromeTransactionDurability: 'strict',
    cache: 'disabled',
  });
  database.version(1).stores({
    entries: '[device+seq], &id, [state+device+seq], revision, altered_from',
    keys: 'key',
    drafts: '[person+key], key',
    people: 'id',
    photos: '[sha256+part], sha256',
    ballast: 'part',
  });
  return database as BookDatabase;
}
