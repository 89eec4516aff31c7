import type { DocKey, DocKind, Document } from '../../domain/book/documents/document';
import { docKey } from '../../domain/book/documents/document';
import { runEffectAsync } from '../../domain/book/documents/effect';
import { chainHash } from '../../domain/book/entry';
import { FOLD_VERSION, foldEntry } from '../../domain/book/fold';
import { GENESIS_HASH } from '../../domain/book/ids';
import type { PullAnswer, Pulled } from '../../domain/handover/wire';
import type { IdbPort } from '../ports/ports';
import { mirrorDatabase, type CursorRow, type DocRow, type MirrorDatabase } from './mirror-database';

export type MirrorCursor = Omit<CursorRow, 'key'>;

export const EMPTY_CURSOR: MirrorCursor = {
  epoch: null,
  revision: 0,
  hash: GENESIS_HASH,
  fold_version: FOLD_VERSION,
  backup_revision: 0,
};

const OUTDATED = 0;

export type PageOutcome =
  | { readonly type: 'applied'; readonly cursor: MirrorCursor; readonly changed: readonly Document[] }
  /** Another holder moved the mirror meanwhile: nothing was written (protocol 3.9). */
  | { readonly type: 'moved' }
  /** The page does not continue the chain that this mirror stands on. */
  | { readonly type: 'broken'; readonly words: string };

export interface MirrorContent {
  readonly cursor: MirrorCursor;
  readonly documents: readonly Document[];
}

/** True until a whole Book of this fold version stands here: till then no rig is ready (protocol 3.8). */
export function isFilling(cursor: MirrorCursor): boolean {
  return cursor.epoch === null || cursor.fold_version !== FOLD_VERSION;
}

export type MirrorStore = ReturnType<typeof openMirrorStore>;

export function openMirrorStore(lab: string, idb: IdbPort) {
  const database = mirrorDatabase(lab, idb);
  return {
    database,
    cursor: () => readCursor(database),
    /** Cursor and documents of the given kinds as of one moment. */
    load: (kinds: readonly DocKind[]): Promise<MirrorContent> =>
      database.transaction('r', [database.documents, database.meta], async () => {
        const rows = await database.documents
          .where('kind')
          .anyOf([...kinds])
          .toArray();
        return { cursor: await readCursor(database), documents: rows.map((row) => row.doc) };
      }),
    get: async (key: DocKey): Promise<Document | undefined> =>
      (await database.documents.get(docKey(key)))?.doc,
    loadKeys: (keys: readonly string[]): Promise<MirrorContent> =>
      database.transaction('r', [database.documents, database.meta], async () => {
        const rows = await database.documents.bulkGet([...keys]);
        return {
          cursor: await readCursor(database),
          documents: rows.flatMap((row) => (row === undefined ? [] : [row.doc])),
        };
      }),
    children: async (kind: DocKind, parent: string): Promise<readonly Document[]> =>
      (await database.documents.where('[kind+parent]').equals([kind, parent]).toArray()).map(
        (row) => row.doc,
      ),
    pulledByIds: async (ids: readonly string[]): Promise<readonly Pulled[]> =>
      (
        await database.entries
          .where('id')
          .anyOf([...ids])
          .toArray()
      ).map((row) => row.pulled),
    applyPage: (page: PullAnswer) =>
      database.transaction(
        'rw',
        [database.documents, database.entries, database.meta],
        async () => await applyPage(database, page),
      ),
    /** From now on it counts as filling, until a fill has flipped. */
    outdate: () =>
      database.transaction('rw', [database.meta], async () => {
        await writeCursor(database, { ...(await readCursor(database)), fold_version: OUTDATED });
      }),
    noteBackup: (revision: number) =>
      database.transaction('rw', [database.meta], async () => {
        const cursor = await readCursor(database);
        if (cursor.backup_revision !== revision)
          await writeCursor(database, { ...cursor, backup_revision: revision });
      }),
    close: () => {
      database.close();
    },
  };
}

export function toDocRow(doc: Document): DocRow {
  return { key: docKey(doc), kind: doc.kind, parent: doc.parent ?? '', doc };
}

export async function readCursor(database: MirrorDatabase): Promise<MirrorCursor> {
  const row = await database.meta.get('cursor');
  if (row === undefined) return EMPTY_CURSOR;
  const { key: _key, ...cursor } = row;
  return cursor;
}

export async function writeCursor(database: MirrorDatabase, cursor: MirrorCursor): Promise<void> {
  await database.meta.put({ key: 'cursor', ...cursor });
}

async function applyPage(database: MirrorDatabase, page: PullAnswer): Promise<PageOutcome> {
  const cursor = await readCursor(database);
  if (cursor.revision !== page.since || cursor.epoch !== page.epoch || isFilling(cursor))
    return { type: 'moved' };
  const chain = followChain(cursor, page);
  if (chain.type === 'broken') return chain;
  const changed = new Map<string, Document>();
  const source = { get: async (key: DocKey) => (await database.documents.get(docKey(key)))?.doc };
  for (const { entry, verdict, reason, revision } of page.entries) {
    // Only the envelope of a stub travels, so there is nothing to fold until its text is brought in.
    if ('stub' in entry) continue;
    await runEffectAsync(foldEntry(entry, { verdict, reason, revision }), source, changed);
  }
  const next = { ...cursor, revision: page.to, hash: chain.hash };
  await database.documents.bulkPut([...changed.values()].map(toDocRow));
  await database.entries.bulkPut(
    page.entries.map((pulled) => ({ revision: pulled.revision, id: pulled.entry.id, pulled })),
  );
  await writeCursor(database, next);
  return { type: 'applied', cursor: next, changed: [...changed.values()] };
}

type ChainOutcome =
  { readonly type: 'whole'; readonly hash: string } | { readonly type: 'broken'; readonly words: string };

/** Every revision takes part, so the count and the hashes are an assertion, not a hope (protocol 3.3). */
function followChain(cursor: MirrorCursor, page: PullAnswer): ChainOutcome {
  let { revision, hash } = cursor;
  for (const pulled of page.entries) {
    revision += 1;
    hash = chainHash(hash, { ...pulled, entry_sha: pulled.entry.entry_sha });
    if (pulled.revision !== revision || pulled.chain_hash !== hash)
      return { type: 'broken', words: `The chain of the Book does not hold at revision ${pulled.revision}.` };
  }
  if (revision !== page.to)
    return { type: 'broken', words: `The page ends at ${revision}, not at ${page.to}.` };
  return { type: 'whole', hash };
}
