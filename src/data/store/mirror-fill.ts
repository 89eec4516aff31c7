import type { Document } from '../../domain/book/documents/document';
import { FOLD_VERSION } from '../../domain/book/fold';
import type { MirrorDatabase } from './mirror-database';
import { readCursor, toDocRow, writeCursor, type MirrorCursor } from './mirror-store';

export interface FillHeader {
  readonly epoch: string;
  readonly revision: number;
  readonly hash: string;
}

export type FlipOutcome =
  | { readonly type: 'flipped'; readonly cursor: MirrorCursor }
  | { readonly type: 'moved' }
  | { readonly type: 'incomplete'; readonly staged: number; readonly promised: number };

/** A whole Book arriving: staged beside the mirror, and put in its place in one transaction once it is complete. */
export function beginFill(database: MirrorDatabase) {
  return {
    clear: () => database.staged.clear(),
    stage: (documents: readonly Document[]) => database.staged.bulkPut(documents.map(toDocRow)),
    flip: (header: FillHeader, promised: number, since: MirrorCursor): Promise<FlipOutcome> =>
      database.transaction(
        'rw',
        [database.documents, database.staged, database.entries, database.meta, database.set_aside],
        async () => await flip(database, { header, promised, since }),
      ),
  };
}

interface Flip {
  readonly header: FillHeader;
  readonly promised: number;
  readonly since: MirrorCursor;
}

async function flip(database: MirrorDatabase, { header, promised, since }: Flip): Promise<FlipOutcome> {
  const before = await readCursor(database);
  if (before.epoch !== since.epoch || before.revision !== since.revision) return { type: 'moved' };
  const staged = await database.staged.toArray();
  if (staged.length !== promised) return { type: 'incomplete', staged: staged.length, promised };
  if (before.epoch !== null) await setAside(database, before.epoch);
  await database.documents.clear();
  await database.documents.bulkPut(staged);
  await database.staged.clear();
  await database.entries.clear();
  const cursor = {
    epoch: header.epoch,
    revision: header.revision,
    hash: header.hash,
    fold_version: FOLD_VERSION,
    backup_revision: 0,
  };
  await writeCursor(database, cursor);
  return { type: 'flipped', cursor };
}

/** What the old mirror held as entries may be missing from the new Book: a lead can bring it in (protocol 3.11). */
async function setAside(database: MirrorDatabase, epoch: string): Promise<void> {
  const rows = await database.entries.toArray();
  await database.set_aside.bulkPut(rows.map(({ id, pulled }) => ({ id, epoch, pulled })));
}
