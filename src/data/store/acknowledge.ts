import { sealEntry, type Reason, type SealedEntry, type Verdict } from '../../domain/book/entry';
import type { BookDatabase, EntryRow } from './book-database';
import { getCount, putCount } from './book-keys';
import { lastSeq, waitingRow } from './append-entry';

export interface Receipt {
  readonly id: string;
  readonly verdict: Verdict;
  readonly revision: number;
  readonly reason: Reason | null;
}

export interface Received {
  readonly epoch: string;
  readonly now_ms: number;
}

/** Writes what the server said of own entries. Saying the same twice changes nothing. */
export async function acknowledgeInside(
  database: BookDatabase,
  receipts: readonly Receipt[],
  { epoch, now_ms }: Received,
): Promise<void> {
  for (const { id, verdict, revision, reason } of receipts) {
    const row = await database.entries.where('id').equals(id).first();
    if (row === undefined || (row.revision === revision && row.epoch === epoch)) continue;
    await database.entries.put({
      ...row,
      state: verdict,
      revision,
      epoch,
      reason,
      acknowledged_ms: row.acknowledged_ms ?? now_ms,
    });
    const acked = await getCount(database, `acked_seq/${row.device}`);
    if (row.seq > acked) await putCount(database, `acked_seq/${row.device}`, row.seq);
  }
}

/**
 * The first text stands under the id; this one goes on under `fresh`, in the same place of the sequence, since the
 * server has not taken that (protocol 3.4).
 */
export async function continueAltered(
  database: BookDatabase,
  id: string,
  fresh: string,
): Promise<EntryRow | null> {
  const row = await database.entries.where('id').equals(id).first();
  if (row === undefined || row.state !== 'waiting') return null;
  const { device, seq } = row;
  const again = { ...waitingRow(resealed(row.entry, { id: fresh, device, seq })), altered_from: id };
  await database.entries.put(again);
  return again;
}

/** Puts everything of an old tablet that still waits behind a new one, ids and texts unchanged (protocol 3.6). */
export async function moveToDevice(database: BookDatabase, device: string): Promise<number> {
  const waiting = await database.entries
    .where('[state+device+seq]')
    .between(['waiting', '', 0], ['waiting', '\uffff', Infinity])
    .toArray();
  const others = waiting.filter((row) => row.device !== device);
  let seq = await lastSeq(database, device);
  for (const row of others) {
    seq += 1;
    await database.entries.delete([row.device, row.seq]);
    await database.entries.add({
      ...waitingRow(resealed(row.entry, { id: row.id, device, seq })),
      stub: row.stub,
      altered_from: row.altered_from,
    });
  }
  if (others.length > 0) await putCount(database, `last_seq/${device}`, seq);
  return others.length;
}

/** Everything above `last_seq` waits again: the server has lost it or never had it (protocol 3.7, 3.11). */
export async function waitAgainAbove(
  database: BookDatabase,
  device: string,
  last_seq: number,
): Promise<number> {
  const rows = await database.entries
    .where('[device+seq]')
    .between([device, last_seq], [device, Infinity], false)
    .filter((row) => row.state !== 'waiting')
    .toArray();
  for (const row of rows) await waitAgain(database, row);
  await putCount(database, `acked_seq/${device}`, last_seq);
  return rows.length;
}

export async function waitAgain(database: BookDatabase, row: EntryRow): Promise<void> {
  await database.entries.put({ ...row, state: 'waiting', revision: null, epoch: null, reason: null });
}

function resealed(
  entry: SealedEntry,
  place: { readonly id: string; readonly device: string; readonly seq: number },
): SealedEntry {
  const { body, body_sha: _bodySha, entry_sha: _entrySha, ...rest } = entry;
  const subject = entry.subject === entry.id ? place.id : entry.subject;
  return sealEntry({ ...rest, ...place, subject }, body);
}
